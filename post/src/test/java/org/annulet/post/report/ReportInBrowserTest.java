package org.annulet.post.report;

import static org.assertj.core.api.Assertions.assertThat;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.List;
import java.util.logging.Level;
import org.annulet.post.Demo;
import org.annulet.post.chart.Marker;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.openqa.selenium.By;
import org.openqa.selenium.Dimension;
import org.openqa.selenium.Keys;
import org.openqa.selenium.OutputType;
import org.openqa.selenium.WebElement;
import org.openqa.selenium.chrome.ChromeDriver;
import org.openqa.selenium.chrome.ChromeDriverService;
import org.openqa.selenium.chrome.ChromeOptions;
import org.openqa.selenium.logging.LogType;
import org.openqa.selenium.logging.LoggingPreferences;
import org.openqa.selenium.support.ui.Select;
import org.openqa.selenium.support.ui.WebDriverWait;

/** The report opened in Chromium: it moves, says nothing bad and asks the network for nothing. */
class ReportInBrowserTest {
  private static final Path CHROMIUM = Path.of("/usr/bin/chromium");
  private static final Path DRIVER = Path.of("/usr/bin/chromedriver");

  @TempDir static Path folder;
  private static ChromeDriver browser;

  static ReportInput input() {
    Demo demo = new Demo(24, 160);
    List<Fact> facts =
        List.of(
            new Fact("gas", "mean pressure", "1.5e+06 Pa"),
            new Fact("gas", "<img src=x onerror=alert(1)>", "\"</script><script>alert(2)</script>"),
            new Fact("flames", "response", "n = 1.2, τ = 0.0035 s"));
    List<Marker> marks =
        List.of(
            new Marker("flame <1>", Marker.Kind.FLAME, 0.3, 0.6),
            new Marker("damper 1", Marker.Kind.PORT, 0.45, 1.6));
    return new ReportInput(demo.results, demo.chamber, facts, marks);
  }

  @BeforeAll
  static void open() throws Exception {
    assumeTrue(
        Files.isExecutable(CHROMIUM) && Files.isExecutable(DRIVER), "Chromium is not installed");
    Path page = folder.resolve("report.html");
    HtmlReport.write(page, input());
    ChromeOptions options = new ChromeOptions();
    options.setBinary(CHROMIUM.toString());
    options.addArguments(
        "--headless=new",
        "--no-sandbox",
        "--disable-gpu",
        "--disable-background-networking",
        "--user-data-dir=" + Files.createTempDirectory("annulet-browser"));
    LoggingPreferences logs = new LoggingPreferences();
    logs.enable(LogType.BROWSER, Level.ALL);
    logs.enable(LogType.PERFORMANCE, Level.ALL);
    options.setCapability("goog:loggingPrefs", logs);
    ChromeDriverService service =
        new ChromeDriverService.Builder()
            .usingDriverExecutable(DRIVER.toFile())
            .usingAnyFreePort()
            .withSilent(true)
            .build();
    browser = new ChromeDriver(service, options);
    browser.manage().window().setSize(new Dimension(1600, 1000));
    browser.get(page.toUri().toString());
  }

  @AfterAll
  static void close() {
    if (browser != null) {
      browser.quit();
    }
  }

  private static WebElement mode(int number) {
    WebElement article = browser.findElement(By.id("mode-" + number));
    browser.executeScript("arguments[0].scrollIntoView({behavior:'instant'})", article);
    WebElement canvas = article.findElement(By.tagName("canvas"));
    new WebDriverWait(browser, Duration.ofSeconds(10)).until(d -> coloured(canvas) > 100);
    return article;
  }

  /** Number of pixels that are not transparent. */
  private static long coloured(WebElement canvas) {
    return (Long)
        browser.executeScript(
            "const c=arguments[0];const d=c.getContext('2d').getImageData(0,0,c.width,c.height)"
                + ".data;let n=0;for(let i=3;i<d.length;i+=4)if(d[i])n++;return n;",
            canvas);
  }

  private static String picture(WebElement article) {
    return (String)
        browser.executeScript("return arguments[0].querySelector('canvas').toDataURL()", article);
  }

  @Test
  void slider_changesThePictureAndComesBackAfterAFullTurn() {
    WebElement article = mode(1);
    WebElement slider = article.findElement(By.cssSelector("input[type=range]"));
    slide(slider, 0);
    String before = picture(article);
    slide(slider, 180);
    String half = picture(article);
    assertThat(half).isNotEqualTo(before);
    assertThat(article.findElement(By.tagName("output")).getText()).isEqualTo("180°");
    slide(slider, 360);
    assertThat(picture(article)).isEqualTo(before);
  }

  private static void slide(WebElement slider, int degrees) {
    browser.executeScript(
        "arguments[0].value=arguments[1];arguments[0].dispatchEvent(new Event('input'))",
        slider,
        degrees);
  }

  @Test
  void picture_showsTheSignOfThePressure() {
    // mode 1 is cos(0)·cos(0) = 1 everywhere in phase: at 0° all pressure, at 180° all suction
    WebElement article = mode(1);
    WebElement slider = article.findElement(By.cssSelector("input[type=range]"));
    slide(slider, 0);
    assertThat(redMinusBlue(article)).isPositive();
    slide(slider, 180);
    assertThat(redMinusBlue(article)).isNegative();
  }

  private static double redMinusBlue(WebElement article) {
    return ((Number)
            browser.executeScript(
                "const c=arguments[0].querySelector('canvas');const d=c.getContext('2d')"
                    + ".getImageData(c.width/2,c.height/2,9,9).data;"
                    + "let s=0;for(let i=0;i<d.length;i+=4)s+=d[i]-d[i+2];return s;",
                article))
        .doubleValue();
  }

  @Test
  void keyboardAlone_startsAndStopsTheMotion() {
    WebElement article = mode(2);
    WebElement button = article.findElement(By.tagName("button"));
    String before = picture(article);
    button.sendKeys(Keys.ENTER);
    assertThat(button.getText()).isEqualTo("Pause");
    new WebDriverWait(browser, Duration.ofSeconds(10)).until(d -> !picture(article).equals(before));
    button.sendKeys(Keys.SPACE);
    assertThat(button.getText()).isEqualTo("Play");
    String stopped = picture(article);
    assertThat(picture(article)).isEqualTo(stopped);
  }

  @Test
  void splitPair_offersSpinningAndStandingCombinations() {
    WebElement article = mode(3);
    Select which = new Select(article.findElement(By.tagName("select")));
    assertThat(which.getOptions())
        .extracting(WebElement::getText)
        .containsExactly(
            "the mode as computed",
            "spins towards smaller angles",
            "spins towards larger angles",
            "stands, maximum at 0°",
            "stands, node at 0°",
            "where a damper helps",
            "where the flame drives");
    String before = picture(article);
    which.selectByIndex(1);
    assertThat(picture(article)).isNotEqualTo(before);
    WebElement alone = browser.findElement(By.id("mode-1"));
    assertThat(new Select(alone.findElement(By.tagName("select"))).getOptions()).hasSize(3);
  }

  @Test
  void damperMap_standsStillAndIsDampingEverywhere() {
    WebElement article = mode(1);
    Select which = new Select(article.findElement(By.tagName("select")));
    which.selectByVisibleText("where a damper helps");
    assertThat(article.findElement(By.cssSelector(".phase")).isDisplayed()).isFalse();
    assertThat(article.findElement(By.tagName("button")).isDisplayed()).isFalse();
    assertThat(article.findElement(By.cssSelector(".legend")).getText()).contains("per cm²");
    assertThat(redMinusBlue(article)).isNegative(); // −2000 |p|²: blue-green damps
    which.selectByIndex(0);
    assertThat(article.findElement(By.cssSelector(".phase")).isDisplayed()).isTrue();
    slide(article.findElement(By.cssSelector("input[type=range]")), 0);
    assertThat(redMinusBlue(article)).isPositive();
  }

  @Test
  void placesForDampers_arePicturedAndListed() {
    WebElement part = browser.findElement(By.id("dampers"));
    browser.executeScript("arguments[0].scrollIntoView({behavior:'instant'})", part);
    WebElement canvas = part.findElement(By.tagName("canvas"));
    new WebDriverWait(browser, Duration.ofSeconds(10)).until(d -> coloured(canvas) > 100);
    assertThat(redMinusBlue(part)).isNegative();
    assertThat(part.getText()).contains("Mode 1").contains("edge right").contains("1/s per cm²");
  }

  @Test
  void sensitivities_areRankedBars() {
    WebElement bars = mode(2).findElement(By.cssSelector(".levers"));
    assertThat(bars.getText())
        .contains("flames.<1>.response.delay 2.1 ms")
        .contains("+0.200")
        .contains("±4 %")
        .contains("−0.050");
    assertThat(bars.findElements(By.cssSelector(".track i"))).hasSize(2);
  }

  @Test
  void printOnA4_givesAPdfOfThePagesWithoutControls() {
    org.openqa.selenium.Pdf pdf = browser.print(new org.openqa.selenium.print.PrintOptions());
    byte[] bytes = java.util.Base64.getDecoder().decode(pdf.getContent());
    assertThat(new String(bytes, 0, 5, java.nio.charset.StandardCharsets.US_ASCII))
        .isEqualTo("%PDF-");
    browser.executeCdpCommand("Emulation.setEmulatedMedia", java.util.Map.of("media", "print"));
    assertThat(mode(2).findElement(By.tagName("button")).isDisplayed()).isFalse();
    browser.executeCdpCommand("Emulation.setEmulatedMedia", java.util.Map.of("media", ""));
  }

  @Test
  void nothingIsRequestedAndNothingIsLogged() {
    mode(6);
    List<String> requests =
        browser.manage().logs().get(LogType.PERFORMANCE).getAll().stream()
            .map(Object::toString)
            .filter(m -> m.contains("Network.requestWillBeSent\""))
            .filter(m -> m.contains("\"documentURL\":\"file:")) // the browser's own pages aside
            .filter(m -> !m.contains("report.html\"},") && !m.contains("\"url\":\"data:"))
            .toList();
    assertThat(requests).isEmpty();
    assertThat(
            browser.manage().logs().get(LogType.BROWSER).getAll().stream()
                .map(Object::toString)
                .filter(m -> !m.contains("willReadFrequently"))) // this test's own reading back
        .isEmpty();
    assertThat(browser.findElements(By.tagName("img"))).isEmpty(); // injected texts stay texts
    assertThat(browser.findElement(By.id("case")).getText())
        .contains("<img src=x onerror=alert(1)>");
  }

  @Test
  void narrowAndWide_nothingStandsOverTheSide() throws Exception {
    String keep = System.getProperty("annulet.screenshots");
    for (int width : new int[] {390, 1600}) {
      browser.executeCdpCommand(
          "Emulation.setDeviceMetricsOverride",
          java.util.Map.of(
              "width", width, "height", 900, "deviceScaleFactor", 1, "mobile", width < 500));
      Long over =
          (Long)
              browser.executeScript(
                  "return document.documentElement.scrollWidth - window.innerWidth");
      assertThat(over).as("width " + width).isLessThanOrEqualTo(0);
      if (keep != null) {
        shoot(Path.of(keep), width);
      }
    }
    browser.executeCdpCommand("Emulation.clearDeviceMetricsOverride", java.util.Map.of());
  }

  private static void shoot(Path to, int width) throws Exception {
    for (String scheme : new String[] {"light", "dark"}) {
      browser.executeCdpCommand(
          "Emulation.setEmulatedMedia",
          java.util.Map.of(
              "features",
              List.of(java.util.Map.of("name", "prefers-color-scheme", "value", scheme))));
      for (String part : new String[] {"", "chamber", "spectrum", "table", "dampers", "mode-3"}) {
        browser.executeScript(
            "const e=document.getElementById(arguments[0]);e?e.scrollIntoView({behavior:'instant'})"
                + ":scrollTo({top:0,behavior:'instant'})",
            part);
        Thread.sleep(400);
        Files.write(
            to.resolve(width + "-" + scheme + "-" + (part.isEmpty() ? "top" : part) + ".png"),
            browser.getScreenshotAs(OutputType.BYTES));
      }
    }
    browser.executeCdpCommand(
        "Emulation.setEmulatedMedia", java.util.Map.of("features", List.of()));
  }
}
