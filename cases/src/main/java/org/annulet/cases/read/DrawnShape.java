package org.annulet.cases.read;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.annulet.mesher.files.FaultPicture;
import org.annulet.mesher.geometry.GeometryFault;
import org.annulet.mesher.geometry.RingShape;
import org.annulet.mesher.geometry.Zone;

/**
 * The geometry of a case as the mesher draws it, and the mesher's faults as problems of the file.
 */
public final class DrawnShape {
  private static final Pattern QUOTED = Pattern.compile("'([^']+)'");
  private static final List<String> PLACES = List.of("edges", "zones", "points");

  private DrawnShape() {}

  /**
   * The outline as drawn: checked for crossings, touching, overlap.
   *
   * @throws GeometryFault if it cannot be meshed
   */
  public static org.annulet.mesher.geometry.Outline outline(Outline read) {
    org.annulet.mesher.geometry.Outline.Builder b = org.annulet.mesher.geometry.Outline.builder();
    read.points().forEach((name, p) -> b.point(name, p.x(), p.y()));
    read.edges()
        .forEach(
            (name, e) -> {
              String[] through = e.points().toArray(String[]::new);
              switch (e.shape()) {
                case LINE -> b.line(name, through);
                case ARC -> b.arc(name, through[0], through[1], through[2]);
                case CURVE -> b.curve(name, through);
              }
            });
    read.zones().forEach((name, z) -> b.zone(new Zone(name, z.boundary(), z.holes())));
    return b.build();
  }

  /**
   * The ring as drawn.
   *
   * @throws GeometryFault if it cannot be meshed
   */
  public static RingShape ring(Geometry.Ring ring) {
    List<RingShape.RingZone> zones = new ArrayList<>();
    for (Geometry.RingZone z : ring.zones()) {
      if (z instanceof Geometry.Annulus a) {
        zones.add(RingShape.RingZone.annulus(a.name(), a.meanRadius(), a.gap(), a.length()));
      } else if (z instanceof Geometry.Ducts d) {
        zones.add(RingShape.RingZone.ducts(d.name(), d.meanRadius(), d.bore(), d.length()));
      }
    }
    return new RingShape(ring.burnerCount(), ring.unrolledRadius(), zones);
  }

  /**
   * Faults of the mesher as problems: each at the edge, zone or point it names first.
   *
   * @param source where the case was read
   * @param fault what the mesher says
   */
  public static List<Problem> problems(CaseSource source, GeometryFault fault) {
    List<Problem> problems = new ArrayList<>();
    for (int i = 0; i < fault.faults().size(); i++) {
      GeometryFault.Fault f = fault.faults().get(i);
      String[] text = f.toString().split("\\R\\s*mend: ", 2);
      problems.add(
          source
              .problem(key(source, f.what()), text[0], f.mend())
              .withPicture(FaultPicture.svg(fault, i).orElse("")));
    }
    return problems;
  }

  private static String key(CaseSource source, String what) {
    Matcher m = QUOTED.matcher(what);
    while (m.find()) {
      for (String place : PLACES) {
        String key = "geometry." + place + "." + m.group(1);
        if (source.places().containsKey(key)) {
          return key;
        }
      }
    }
    return "geometry";
  }

  /** Draws the geometry to have it checked. */
  static Optional<GeometryFault> check(Geometry geometry) {
    try {
      if (geometry instanceof Geometry.Ring r) {
        ring(r);
      } else if (geometry instanceof Geometry.Section s) {
        outline(s.outline());
      } else if (geometry instanceof Geometry.CrossSection c) {
        outline(c.outline());
      } else if (geometry instanceof Geometry.Plane p) {
        outline(p.outline());
      }
      return Optional.empty();
    } catch (GeometryFault fault) {
      return Optional.of(fault);
    }
  }
}
