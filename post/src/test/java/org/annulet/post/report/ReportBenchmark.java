package org.annulet.post.report;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.IntStream;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.post.Meshes;
import org.annulet.post.meaning.Certificate;
import org.annulet.post.meaning.Chamber;
import org.annulet.post.meaning.GrowthBudget;
import org.annulet.post.meaning.Labels;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.ModeLabel;
import org.annulet.post.meaning.ModeMaps;
import org.annulet.post.meaning.ModeView;
import org.annulet.post.meaning.ParameterSensitivity;
import org.annulet.post.meaning.Results;
import org.annulet.solver.modes.Window;
import org.openqa.selenium.Dimension;
import org.openqa.selenium.chrome.ChromeDriver;
import org.openqa.selenium.chrome.ChromeDriverService;
import org.openqa.selenium.chrome.ChromeOptions;

/**
 * Size and first answer of the report of a ring of 1e5 nodes with 20 modes, each with maps, budget
 * and sensitivities. Interactive means: the field of the first mode stands on the page, its phase
 * slider is moved and the picture has changed, counted from the call that opens the page. Each
 * opening in a new window of a headless Chromium, beside an empty page opened in the same way. Not
 * a test: run by hand. Argument: repetitions (7 unless given).
 */
final class ReportBenchmark {
  private static final int ALONG = 195;
  private static final int ROUND = 512;
  private static final int MODES = 20;

  private ReportBenchmark() {}

  /**
   * Writes the report, opens it and an empty page in turn.
   *
   * @throws IOException if the report cannot be written
   */
  public static void main(String[] arguments) throws IOException {
    int repetitions = arguments.length > 0 ? Integer.parseInt(arguments[0]) : 7;
    Path folder = Files.createTempDirectory("annulet-report");
    Path page = folder.resolve("report.html");
    ReportInput input = input();
    long start = System.nanoTime();
    HtmlReport.write(page, input);
    double written = 1e-9 * (System.nanoTime() - start);
    Path empty = folder.resolve("empty.html");
    Files.writeString(empty, "<!doctype html><title>empty</title><p>nothing");
    List<Double> ours = new ArrayList<>();
    List<Double> none = new ArrayList<>();
    ChromeDriver browser = browser();
    try {
      for (int r = 0; r < repetitions; r++) {
        none.add(opened(browser, empty));
        ours.add(answered(browser, page));
      }
    } finally {
      browser.quit();
    }
    System.out.println(
        String.format(
            Locale.ROOT,
            "{\"nodes\": %d, \"modes\": %d, \"bytes\": %d, \"written_s\": %.2f,"
                + " \"interactive_s\": {\"median\": %.3f, \"worst\": %.3f, \"first\": %.3f},"
                + " \"empty_page_s\": {\"median\": %.3f}, \"ratio\": %.1f}",
            input.chamber().mesh().nodeCount(),
            input.results().modes().size(),
            Files.size(page),
            written,
            median(ours),
            ours.stream().mapToDouble(x -> x).max().orElseThrow(),
            ours.get(0),
            median(none),
            median(ours) / median(none)));
  }

  private static double median(List<Double> all) {
    return all.stream().sorted().toList().get(all.size() / 2);
  }

  private static double opened(ChromeDriver browser, Path page) {
    browser.switchTo().newWindow(org.openqa.selenium.WindowType.TAB);
    long start = System.nanoTime();
    browser.get(page.toUri().toString());
    browser.executeScript("return document.querySelector('p').textContent");
    return 1e-9 * (System.nanoTime() - start);
  }

  /** From the call that opens the page to the picture that has answered the slider. */
  private static double answered(ChromeDriver browser, Path page) {
    browser.switchTo().newWindow(org.openqa.selenium.WindowType.TAB);
    long start = System.nanoTime();
    browser.get(page.toUri().toString());
    Object changed =
        browser.executeAsyncScript(
            """
            const done = arguments[0], article = document.getElementById('mode-1');
            article.scrollIntoView({behavior: 'instant'});
            const canvas = article.querySelector('canvas');
            const slider = article.querySelector('input[type=range]');
            const filled = () => {
              const d = canvas.getContext('2d').getImageData(0, 0, canvas.width, canvas.height).data;
              let n = 0;
              for (let i = 3; i < d.length; i += 4) if (d[i]) n++;
              return n;
            };
            const wait = () => {
              if (filled() < 100) return requestAnimationFrame(wait);
              const before = canvas.toDataURL();
              slider.value = 90;
              slider.dispatchEvent(new Event('input'));
              const answer = () =>
                  canvas.toDataURL() === before ? requestAnimationFrame(answer) : done(true);
              answer();
            };
            wait();
            """);
    if (!Boolean.TRUE.equals(changed)) {
      throw new IllegalStateException("the picture did not answer");
    }
    return 1e-9 * (System.nanoTime() - start);
  }

  private static ChromeDriver browser() throws IOException {
    ChromeOptions options = new ChromeOptions();
    options.setBinary("/usr/bin/chromium");
    options.addArguments(
        "--headless=new",
        "--no-sandbox",
        "--disable-gpu",
        "--disable-background-networking",
        "--window-size=1600,1000",
        "--user-data-dir=" + Files.createTempDirectory("annulet-browser"));
    ChromeDriverService service =
        new ChromeDriverService.Builder()
            .usingDriverExecutable(Path.of("/usr/bin/chromedriver").toFile())
            .usingAnyFreePort()
            .withSilent(true)
            .build();
    ChromeDriver browser = new ChromeDriver(service, options);
    browser.manage().window().setSize(new Dimension(1600, 1000));
    return browser;
  }

  private static ReportInput input() {
    double round = 2 * Math.PI * 0.4;
    Mesh mesh = Meshes.ring(0.6, round, ALONG, ROUND, "plenum", "burners", "chamber");
    Chamber chamber = Chamber.ring(mesh, new double[] {0.45, 0.42, 0.4});
    List<ModeView> views =
        IntStream.range(0, MODES).mapToObj(i -> view(mesh, i % 7, i / 7, i)).toList();
    List<ModeLabel> labels = Labels.of(chamber, views);
    List<ModeEntry> modes = new ArrayList<>();
    for (int i = 0; i < MODES; i++) {
      ModeView v = views.get(i);
      double[] damper = new double[mesh.nodeCount()];
      Arrays.setAll(damper, k -> -2000 * (v.re()[k] * v.re()[k] + v.im()[k] * v.im()[k]));
      double g = v.mode().growthRate();
      modes.add(
          new ModeEntry(v, labels.get(i), Optional.of(budget(g)))
              .with(sensitivities(i))
              .with(new ModeMaps(damper, v.im())));
    }
    Results results =
        new Results(
            "invented ring of 100,000 nodes",
            "0",
            new Window(20, 2000, -300, 300),
            List.of(new Certificate("ring", null, MODES, MODES, true, List.of())),
            modes,
            List.of(),
            List.of("All data of this case are invented."));
    List<Fact> facts =
        IntStream.range(0, 80)
            .mapToObj(i -> new Fact("part " + i / 10, "number " + i, i + ".5 mm"))
            .toList();
    return new ReportInput(results, chamber, facts, List.of());
  }

  /**
   * Waves along and round, a part that runs and a local one, so that the field is not too plain.
   */
  private static ModeView view(Mesh mesh, int order, int axial, int i) {
    return Meshes.mode(
        mesh,
        new double[] {120 + 90 * i, 20 - 9 * i},
        null,
        (x, y) ->
            Math.cos(order * y / 0.4) * Math.cos(axial * Math.PI * x / 0.6)
                + 0.2 * Math.sin(12 * y / 0.4 + i) * Math.exp(-30 * Math.abs(x - 0.3)),
        (x, y) ->
            0.3 * Math.sin(order * y / 0.4 + i) * Math.sin((axial + 0.5) * Math.PI * x / 0.6));
  }

  private static GrowthBudget budget(double g) {
    List<GrowthBudget.Item> items = new ArrayList<>();
    for (int j = 0; j < 14; j++) {
      items.add(new GrowthBudget.Item("flame burner " + (j + 1), 5 + 0.1 * j, -0.2));
    }
    double sum = items.stream().mapToDouble(GrowthBudget.Item::growthShare).sum();
    items.add(new GrowthBudget.Item("two-port burners", g - sum, 1));
    return new GrowthBudget(items, g, 0);
  }

  private static List<ParameterSensitivity> sensitivities(int i) {
    return IntStream.range(0, 60)
        .mapToObj(
            k ->
                new ParameterSensitivity(
                    "flames.main.number_" + k, k + " mm", (60 - k) * 0.01 * (i - 9.5), 0.1, 5))
        .toList();
  }
}
