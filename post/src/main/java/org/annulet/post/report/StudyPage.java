package org.annulet.post.report;

import static org.annulet.post.chart.Svg.escape;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.List;
import org.annulet.post.meaning.Results;
import org.annulet.post.table.Summary;

/**
 * The page of a study, part by part: one file with everything in it, in the dress of the report. A
 * content policy in its head forbids every request; all texts are escaped. Not thread-safe.
 */
public final class StudyPage {
  private final StringBuilder b = new StringBuilder(1 << 14);
  private final String version;
  private boolean partOpen;

  /**
   * Begins a page.
   *
   * @param kind of study, in a few words
   * @param title of the case
   * @param version of the program
   */
  public StudyPage(String kind, String title, String version) {
    this.version = version;
    b.append("<!DOCTYPE html>\n<html lang=\"en\">\n<head>\n<meta charset=\"utf-8\">\n")
        .append("<meta name=\"viewport\" content=\"width=device-width, initial-scale=1\">\n")
        .append("<meta http-equiv=\"Content-Security-Policy\" content=\"default-src 'none'; ")
        .append("style-src 'unsafe-inline'; img-src data:\">\n")
        .append("<link rel=\"icon\" href=\"data:,\">\n<title>")
        .append(escape(kind))
        .append(": ")
        .append(escape(title))
        .append("</title>\n<style>\n")
        .append(css())
        .append("</style>\n</head>\n<body>\n<header><p class=\"eyebrow\">")
        .append(escape(kind))
        .append("</p><h1>")
        .append(escape(title))
        .append("</h1>\n");
  }

  /** What is certain. */
  public StudyPage certified(String words) {
    b.append("<p class=\"seal\">").append(escape(words)).append("</p>\n");
    return this;
  }

  /** What is not certain. */
  public StudyPage notCertified(String words) {
    b.append("<p class=\"seal not\">").append(escape(words)).append("</p>\n");
    return this;
  }

  /** The answer in sentences, and the cautions every page carries; ends the head. */
  public StudyPage answer(List<String> sentences) {
    b.append("<div class=\"answer\">\n");
    sentences.forEach(s -> b.append("<p>").append(escape(s)).append("</p>\n"));
    b.append("</div>\n<p class=\"sign\">")
        .append("Growth rates are in 1/s and positive when the mode grows; ")
        .append(escape(Results.SIGN_CONVENTION))
        .append(".</p>\n<aside class=\"cautions\" aria-label=\"Cautions\"><strong>Before anyone ")
        .append("relies on this</strong><ul>");
    Summary.CAUTIONS.forEach(c -> b.append("<li>").append(escape(c)).append("</li>"));
    b.append("</ul></aside></header>\n<main>\n");
    return this;
  }

  /** Begins a part. */
  public StudyPage part(String heading) {
    endPart();
    b.append("<section><h2>").append(escape(heading)).append("</h2>\n");
    partOpen = true;
    return this;
  }

  /** A paragraph. */
  public StudyPage paragraph(String text) {
    b.append("<p>").append(escape(text)).append("</p>\n");
    return this;
  }

  /**
   * A picture.
   *
   * @param svg one SVG element, taken as it is
   * @param caption below it
   */
  public StudyPage figure(String svg, String caption) {
    b.append("<figure>").append(svg).append("<figcaption>").append(escape(caption));
    b.append("</figcaption></figure>\n");
    return this;
  }

  /**
   * A table.
   *
   * @param heads of the columns
   * @param rows texts, numbers among them set right
   */
  public StudyPage table(List<String> heads, List<List<String>> rows) {
    b.append("<div class=\"scroll\" tabindex=\"0\" role=\"region\" aria-label=\"Table\"><table>");
    b.append("<thead><tr>");
    for (int c = 0; c < heads.size(); c++) {
      b.append(numeric(rows, c) ? "<th scope=\"col\" class=\"num\">" : "<th scope=\"col\">");
      b.append(escape(heads.get(c))).append("</th>");
    }
    b.append("</tr></thead><tbody>\n");
    for (List<String> row : rows) {
      b.append("<tr>");
      for (int c = 0; c < row.size(); c++) {
        b.append(numeric(rows, c) ? "<td class=\"num\">" : "<td>");
        b.append(escape(row.get(c))).append("</td>");
      }
      b.append("</tr>\n");
    }
    b.append("</tbody></table></div>\n");
    return this;
  }

  private static boolean numeric(List<List<String>> rows, int column) {
    return rows.stream().allMatch(r -> r.get(column).matches("[-+−]?[0-9].*|–|"));
  }

  /** The finished page. */
  public String html() {
    endPart();
    return b
        + "</main>\n<footer>Made by annulet "
        + escape(version)
        + ". "
        + escape(Results.SIGN_CONVENTION)
        + ".</footer>\n</body>\n</html>\n";
  }

  private void endPart() {
    b.append(partOpen ? "</section>\n" : "");
    partOpen = false;
  }

  private static String css() {
    try (InputStream in = StudyPage.class.getResourceAsStream("report.css")) {
      return new String(in.readAllBytes(), StandardCharsets.UTF_8);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
