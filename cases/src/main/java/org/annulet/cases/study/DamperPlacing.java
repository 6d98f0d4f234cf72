package org.annulet.cases.study;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import org.annulet.cases.read.Damper;
import org.annulet.cases.read.DamperSearch;
import org.annulet.cases.read.Geometry;
import org.annulet.post.chart.RingPlan;

/** A pattern as places in the workshop: one row for each damper, by angle. */
final class DamperPlacing {
  private DamperPlacing() {}

  /**
   * A damper at its place.
   *
   * @param number from 1, by angle and x
   * @param design name
   * @param face of the ring
   * @param x in m
   * @param angle in rad, from 0 up to 2π; burner 1 is at 0
   * @param burner nearest, from 1
   * @param offset of the damper from that burner, in rad
   * @param arc along the face from burner 1, in m
   * @param position number of the position in the search, from 0
   */
  record Row(
      int number,
      String design,
      String face,
      double x,
      double angle,
      int burner,
      double offset,
      double arc,
      int position) {}

  static List<Row> rows(DamperStudy.Answer answer, int[] pattern) {
    DamperSearch search = answer.search();
    Geometry.Ring ring = (Geometry.Ring) answer.ports().caseFile().geometry();
    List<Integer> used = new ArrayList<>();
    for (int p = 0; p < pattern.length; p++) {
      if (pattern[p] > 0) {
        used.add(p);
      }
    }
    used.sort(
        Comparator.comparingDouble((Integer p) -> positive(search.positions().get(p).angle()))
            .thenComparingDouble(p -> search.positions().get(p).x()));
    List<Row> rows = new ArrayList<>();
    double pitch = 2 * Math.PI / ring.burnerCount();
    for (int p : used) {
      Damper.OnFace f = search.positions().get(p);
      double angle = positive(f.angle());
      int burner = 1 + Math.floorMod((int) Math.rint(angle / pitch), ring.burnerCount());
      Geometry.Annulus zone = (Geometry.Annulus) ring.zone(f.zone());
      double radius =
          zone.meanRadius() + (f.face().endsWith(".outer_face") ? 0.5 : -0.5) * zone.gap();
      rows.add(
          new Row(
              rows.size() + 1,
              search.candidates().get(pattern[p] - 1).name(),
              f.face(),
              f.x(),
              angle,
              burner,
              Math.IEEEremainder(angle, pitch),
              radius * angle,
              p));
    }
    return rows;
  }

  private static double positive(double angle) {
    double a = angle - 2 * Math.PI * Math.floor(angle / (2 * Math.PI));
    return 2 * Math.PI - a < 1e-9 ? 0 : a;
  }

  /** The picture of the ring with a pattern. */
  static String picture(DamperStudy.Answer answer, int[] pattern) {
    DamperSearch search = answer.search();
    Geometry.Ring ring = (Geometry.Ring) answer.ports().caseFile().geometry();
    List<Damper.OnFace> circles =
        search.positions().stream()
            .map(f -> new Damper.OnFace(f.face(), f.x(), 0))
            .distinct()
            .sorted(Comparator.comparingDouble(Damper.OnFace::x).thenComparing(Damper.OnFace::face))
            .toList();
    List<Row> rows = rows(answer, pattern);
    List<RingPlan.Place> places = new ArrayList<>();
    for (int p = 0; p < pattern.length; p++) {
      Damper.OnFace f = search.positions().get(p);
      int own = p;
      String label =
          rows.stream()
              .filter(r -> r.position == own)
              .map(r -> Integer.toString(r.number))
              .findFirst()
              .orElse("");
      places.add(
          new RingPlan.Place(
              f.face()
                  + ", x = "
                  + Words.fixed(1000 * f.x(), 1)
                  + " mm, "
                  + Words.fixed(Math.toDegrees(positive(f.angle())), 2)
                  + "°",
              f.angle(),
              circles.indexOf(new Damper.OnFace(f.face(), f.x(), 0)),
              pattern[p],
              label));
    }
    return RingPlan.svg(
        ring.burnerCount(),
        circles.size(),
        search.candidates().stream().map(DamperSearch.Candidate::name).toList(),
        places);
  }
}
