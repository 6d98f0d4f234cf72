package org.annulet.post.report;

import static org.annulet.post.chart.Svg.escape;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.post.chart.ChamberPicture;
import org.annulet.post.chart.Marker;
import org.annulet.post.chart.PlaneView;
import org.annulet.post.chart.SpectrumChart;
import org.annulet.post.files.WholeFile;
import org.annulet.post.meaning.Certificate;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.Results;
import org.annulet.post.table.Numbers;
import org.annulet.post.table.Summary;

/**
 * {@code report.html}: one file with everything in it. A content policy in its head forbids every
 * request, so it shows the same wherever it is opened; all texts from the case are escaped.
 */
public final class HtmlReport {
  private final ReportInput input;
  private final Results results;
  private final StringBuilder b = new StringBuilder(1 << 16);

  private HtmlReport(ReportInput input) {
    this.input = input;
    this.results = input.results();
  }

  /**
   * Writes the file, whole or not at all.
   *
   * @throws IOException if the folder cannot be written
   */
  public static void write(Path file, ReportInput input) throws IOException {
    WholeFile.write(file, html(input));
  }

  /** The text of the file. */
  public static String html(ReportInput input) {
    return new HtmlReport(input).page();
  }

  private String page() {
    Mesh mesh = input.chamber().mesh();
    PlaneView view = PlaneView.of(input.chamber().kind());
    ChamberPicture picture = ChamberPicture.of(mesh, view, input.markers());
    b.append("<!DOCTYPE html>\n<html lang=\"en\">\n<head>\n<meta charset=\"utf-8\">\n")
        .append("<meta name=\"viewport\" content=\"width=device-width, initial-scale=1\">\n")
        .append("<meta http-equiv=\"Content-Security-Policy\" content=\"default-src 'none'; ")
        .append("style-src 'unsafe-inline'; script-src 'unsafe-inline'; img-src data:\">\n")
        .append("<link rel=\"icon\" href=\"data:,\">\n<title>Modes of ")
        .append(escape(results.caseName()))
        .append("</title>\n<style>\n")
        .append(resource("report.css"))
        .append("</style>\n</head>\n<body>\n");
    head();
    b.append("<main>\n");
    facts();
    chamber(mesh, picture);
    spectrum();
    table();
    DamperPlaces.append(b, input);
    b.append("<section id=\"modes\"><h2>Mode by mode</h2>\n")
        .append("<noscript><p>The moving fields need scripts; everything else does not.</p>")
        .append("</noscript>\n");
    for (int i = 0; i < results.modes().size(); i++) {
      mode(i);
    }
    b.append("</section>\n</main>\n<footer>Made by annulet ")
        .append(escape(results.programVersion()))
        .append(". ")
        .append(escape(Results.SIGN_CONVENTION))
        .append(".</footer>\n<script type=\"application/json\" id=\"fields\">")
        .append(PageData.json(input, picture, view))
        .append("</script>\n<script>\n")
        .append(resource("report.js"))
        .append("</script>\n</body>\n</html>\n");
    return b.toString();
  }

  private void head() {
    b.append("<header><p class=\"eyebrow\">Acoustic modes</p><h1>")
        .append(escape(results.caseName()))
        .append("</h1>\n<p class=\"seal")
        .append(results.complete() ? "\">certified complete" : " not\">NOT certified complete")
        .append("</p>\n<div class=\"answer\">\n");
    Summary.sentences(results).forEach(s -> paragraph(s, ""));
    b.append("</div>\n");
    paragraph(
        "Growth rates are in 1/s and positive when the mode grows; "
            + Results.SIGN_CONVENTION
            + ".",
        "sign");
    b.append("<aside class=\"cautions\" aria-label=\"Cautions\"><strong>Before anyone relies on")
        .append(" this</strong><ul>");
    Summary.CAUTIONS.forEach(c -> b.append("<li>").append(escape(c)).append("</li>"));
    b.append("</ul></aside></header>\n<nav aria-label=\"Parts of the report\"><ul>");
    String[][] parts = {
      {"case", "Case"},
      {"chamber", "Chamber"},
      {"spectrum", "Spectrum"},
      {"table", "Table"},
      {"dampers", "Dampers"},
      {"modes", "Modes"}
    };
    for (String[] p : parts) {
      if (p[0].equals("dampers") && DamperPlaces.targets(results).isEmpty()) {
        continue;
      }
      b.append("<li><a href=\"#").append(p[0]).append("\">").append(p[1]).append("</a></li>");
    }
    b.append("</ul></nav>\n");
  }

  private void facts() {
    b.append("<section id=\"case\"><h2>The case as understood</h2><div class=\"facts\">\n");
    Map<String, List<Fact>> topics = new LinkedHashMap<>();
    input.facts().forEach(f -> topics.computeIfAbsent(f.topic(), t -> new ArrayList<>()).add(f));
    List<Fact> always = topics.computeIfAbsent("window and mesh", t -> new ArrayList<>());
    always.add(
        new Fact(
            "",
            "frequency",
            range(results.window().lowestFrequency(), results.window().highestFrequency(), "Hz")));
    always.add(
        new Fact(
            "",
            "growth rate",
            range(results.window().lowestGrowth(), results.window().highestGrowth(), "1/s")));
    Mesh mesh = input.chamber().mesh();
    always.add(
        new Fact("", "mesh", mesh.nodeCount() + " nodes, " + mesh.triangleCount() + " triangles"));
    topics.forEach(
        (topic, facts) -> {
          b.append("<div><h3>").append(escape(topic)).append("</h3><dl>");
          facts.forEach(
              f ->
                  b.append("<dt>")
                      .append(escape(f.name()))
                      .append("</dt><dd>")
                      .append(escape(f.value()))
                      .append("</dd>"));
          b.append("</dl></div>\n");
        });
    b.append("</div>\n");
    if (!results.notes().isEmpty()) {
      b.append("<ul class=\"plain\">");
      results.notes().forEach(n -> b.append("<li>").append(escape(n)).append("</li>"));
      b.append("</ul>\n");
    }
    b.append("</section>\n");
  }

  private static String range(double low, double high, String unit) {
    return String.format(Locale.ROOT, "%.6g to %.6g %s", low, high, unit)
        .replaceAll("(\\.\\d*?)0+(?= )", "$1")
        .replaceAll("\\.(?= )", "");
  }

  private void chamber(Mesh mesh, ChamberPicture picture) {
    b.append("<section id=\"chamber\"><h2>Chamber</h2><figure>").append(picture.svg());
    b.append("<figcaption>")
        .append(
            switch (input.chamber().kind()) {
              case SECTION -> "Half section: axis to the right, radius upwards.";
              case RING ->
                  "The ring unrolled: round the ring to the right, downstream down; left"
                      + " and right end are the same place.";
              case CROSS_SECTION -> "Plane across the axis.";
              case PLANE -> "Plane of the rig.";
            })
        .append(" Dashed: inner edges.</figcaption>\n<ul class=\"key\" aria-label=\"Zones\">");
    for (int z = 0; z < mesh.zoneNames().size(); z++) {
      b.append("<li><span class=\"swatch\" style=\"background:var(--zone-")
          .append(z % 6)
          .append(")\"></span>")
          .append(escape(mesh.zoneNames().get(z)))
          .append("</li>");
    }
    b.append("</ul>\n<ul class=\"key\" aria-label=\"Edges\">");
    for (int e = 0; e < picture.edges().size(); e++) {
      b.append("<li>").append(e + 1).append(" ").append(escape(picture.edges().get(e)));
      b.append("</li>");
    }
    for (Marker.Kind kind : Marker.Kind.values()) {
      long n = input.markers().stream().filter(m -> m.kind() == kind).count();
      if (n > 0) {
        b.append("<li><span class=\"swatch\" style=\"background:var(--")
            .append(kind == Marker.Kind.FLAME ? "grow" : "decay")
            .append(")\"></span>")
            .append(n)
            .append(kind == Marker.Kind.FLAME ? " flame" : " port or damper")
            .append(n == 1 ? "" : "s")
            .append("</li>");
      }
    }
    b.append("</ul></figure></section>\n");
  }

  private void spectrum() {
    b.append("<section id=\"spectrum\"><h2>Spectrum</h2><figure><div class=\"wide\">")
        .append(SpectrumChart.svg(results, 1100, 400))
        .append("</div><div class=\"narrow\">")
        .append(SpectrumChart.svg(results, 380, 360))
        .append("</div><figcaption>Triangle: grows. Disc: decays. Hollow: zero lies inside the")
        .append(" error bar. Bars: estimated error of the discretisation, where it was estimated.")
        .append(" The tinted half is unstable.")
        .append(
            SpectrumChart.isCut(results)
                ? " Shown is the span of the modes found; the window searched is larger."
                : "")
        .append("</figcaption></figure>\n<ul class=\"plain\">");
    for (Certificate c : results.certificates()) {
      b.append("<li>").append(escape(c.sentence()));
      if (!c.notes().isEmpty()) {
        b.append("<br><small>").append(escape(String.join("; ", c.notes()))).append(".</small>");
      }
      b.append("</li>");
    }
    b.append("</ul></section>\n");
  }

  private void table() {
    b.append("<section id=\"table\"><h2>Table of modes</h2>")
        .append("<div class=\"scroll\" tabindex=\"0\" role=\"region\" aria-label=\"Table of")
        .append(
            " modes\"><table class=\"modes\"><thead><tr><th>mode</th><th></th><th class=\"num\">m</th>")
        .append("<th class=\"num\">frequency [Hz]</th><th class=\"num\">growth rate [1/s]</th>")
        .append("<th>label</th><th class=\"num\">backward error</th></tr></thead>")
        .append("<tbody>\n");
    for (int i = 0; i < results.modes().size(); i++) {
      ModeEntry e = results.modes().get(i);
      String state = e.stability().name().toLowerCase(Locale.ROOT);
      b.append("<tr><td><a href=\"#mode-")
          .append(i + 1)
          .append("\">Mode ")
          .append(i + 1)
          .append("</a></td>");
      cell("state " + state, state);
      cell(
          "num\" data-name=\"order m",
          e.label().azimuthalOrder() == null ? "–" : e.label().azimuthalOrder().toString());
      cell(
          "num\" data-name=\"frequency [Hz]",
          Numbers.withError(e.view().mode().frequency(), e.view().frequencyError()));
      cell("num\" data-name=\"growth rate [1/s]", growth(e));
      cell("label", e.label().text());
      cell(
          "num\" data-name=\"backward error",
          String.format(Locale.ROOT, "%.0e", e.view().mode().backwardError()));
      b.append("</tr>\n");
    }
    b.append("</tbody></table></div></section>\n");
  }

  /** Growth rate with its bar and a true minus sign. */
  private static String growth(ModeEntry e) {
    return Numbers.withError(e.view().mode().growthRate(), e.view().growthError())
        .replace('-', '−');
  }

  private void cell(String type, String text) {
    b.append("<td class=\"").append(type).append("\">").append(escape(text)).append("</td>");
  }

  private void mode(int i) {
    ModeEntry e = results.modes().get(i);
    int n = i + 1;
    String state = e.stability().name().toLowerCase(Locale.ROOT);
    b.append("<article class=\"mode\" id=\"mode-").append(n).append("\"><div class=\"title\"><h3>");
    b.append("Mode ").append(n).append(": ");
    b.append(
        escape(Numbers.withError(e.view().mode().frequency(), e.view().frequencyError(), "Hz")));
    b.append(", <span class=\"").append(state).append("\">");
    b.append(
        escape(
            Numbers.withError(e.view().mode().growthRate(), e.view().growthError(), "1/s")
                .replace('-', '−')));
    b.append("</span></h3><p>").append(escape(e.label().text())).append("</p></div>\n");
    b.append("<div class=\"field\"><canvas width=\"600\" height=\"200\" role=\"img\" aria-label=\"")
        .append("Pressure of mode ")
        .append(n)
        .append(": ")
        .append(escape(e.label().text()))
        .append(
            "\"></canvas>\n<div class=\"legend\"><span class=\"low\">−</span><span class=\"ramp\"></span>")
        .append(
            "<span class=\"high\">+ pressure, largest amplitude 1</span></div>\n<div class=\"controls\">")
        .append("<button type=\"button\" aria-pressed=\"false\">Play</button>")
        .append(
            "<label class=\"phase\">phase <input type=\"range\" min=\"0\" max=\"360\" step=\"any\"")
        .append(" value=\"0\" aria-label=\"Phase of mode ")
        .append(n)
        .append(" in degrees\"><output>0°</output></label>")
        .append("<label class=\"which\">shown <select aria-label=\"Shown combination of mode ")
        .append(n)
        .append("\"><option value=\"-1\">the mode as computed</option></select></label></div>\n");
    ModeDetails.levers(b, e);
    b.append("</div>\n<div class=\"meaning\">");
    ModeDetails.append(b, input, i);
    b.append("</div></article>\n");
  }

  private void paragraph(String text, String type) {
    b.append(type.isEmpty() ? "<p>" : "<p class=\"" + type + "\">")
        .append(escape(text))
        .append("</p>\n");
  }

  private static String resource(String name) {
    try (InputStream in = HtmlReport.class.getResourceAsStream(name)) {
      if (in == null) {
        throw new IllegalStateException("'" + name + "' is missing from the jar; build it anew");
      }
      return new String(in.readAllBytes(), StandardCharsets.UTF_8);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
