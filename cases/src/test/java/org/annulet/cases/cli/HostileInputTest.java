package org.annulet.cases.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.TreeMap;
import java.util.stream.Stream;
import org.junit.jupiter.api.Assertions;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Rubbish of every kind: the program answers with a fault and exit status 2, or with a result;
 * never with a stack trace, never for minutes, never outside its folder.
 */
class HostileInputTest {
  /** No input may keep the program longer; this is a safety net, not a measure of speed. */
  private static final Duration LONGEST = Duration.ofSeconds(60);

  private static final String CASE =
      """
      annulet: 1
      title: duct with everything
      geometry:
        kind: plane
        depth: 10 mm
        mesh_size: 60 mm
        points: {a: [0 m, 0 m], b: [0.3 m, 0 m], c: [1 m, 0 m], d: [1 m, 50 mm], e: [0.3 m, 50 mm], f: [0 m, 50 mm]}
        edges:
          near: {line: [f, a]}
          cold_floor: {line: [a, b]}
          sheet: {line: [b, e]}
          cold_roof: {line: [e, f]}
          hot_floor: {line: [b, c]}
          far: {line: [c, d]}
          hot_roof: {line: [d, e]}
        zones:
          cold: {boundary: [near, cold_floor, sheet, cold_roof]}
          hot: {boundary: [hot_floor, far, hot_roof, sheet]}
      gas:
        mean_pressure: 1 bar
        zones:
          cold: {temperature: 300 K, mixture: air}
          hot: {temperature: {file: flow.csv}, gamma: 1.3, gas_constant: 290 J/(kg K)}
      walls: {far: {impedance_table: wall.csv}}
      two_ports: {sheet: {loss_coefficient: 1.5, velocity: 10 m/s, flow_from: cold}}
      dampers: {d: {quarter_wave: {bore: 20 mm, length: 200 mm, resistance: 0.1}, at: {edge: near, x: 0 m, y: 25 mm}}}
      flames:
        main:
          heat_release: 1 kW
          place: {sheet: sheet}
          reference: {edge: sheet, flow_from: cold}
          reference_velocity: 10 m/s
          response: {table: flame.csv}
      window: {frequency: [50 Hz, 300 Hz], growth_rate: [-200 1/s, 200 1/s]}
      """;

  @TempDir private Path folder;

  private final Map<String, String> files = new TreeMap<>();

  HostileInputTest() {
    files.put("case.yaml", CASE);
    files.put("flow.csv", rows("x [mm], y [mm], temperature [K]", "%d, 0, 1500", 300, 1000));
    files.put("wall.csv", rows("frequency [Hz], real [1], imaginary [1]", "%d, 9, 1", 0, 600));
    files.put("flame.csv", rows("frequency [Hz], gain [1], phase [°]", "%d, 0.7, -30", 0, 600));
  }

  private static String rows(String head, String row, int from, int to) {
    StringBuilder b = new StringBuilder(head).append('\n');
    for (int k = 0; k <= 6; k++) {
      int value = from + (to - from) * k / 6;
      b.append(row.replace("%d", Integer.toString(value))).append('\n');
      if (head.startsWith("x")) {
        b.append(row.replace("%d", Integer.toString(value)).replace(", 0,", ", 50,")).append('\n');
      }
    }
    return b.toString();
  }

  /** The program on the files as they are; its status and what it complained. */
  private ExitStatus run(List<String> complaints, String verb) throws IOException {
    ByteArrayOutputStream err = new ByteArrayOutputStream();
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    Console console = new Console(stream(out), stream(err), false);
    Path case0 = folder.resolve("case");
    ExitStatus status =
        Assertions.assertTimeoutPreemptively(
            LONGEST,
            () ->
                Main.run(
                    console, verb, case0.toString(), "--out", folder.resolve("out").toString()));
    complaints.add(err.toString(StandardCharsets.UTF_8));
    return status;
  }

  private static PrintStream stream(ByteArrayOutputStream to) {
    return new PrintStream(to, true, StandardCharsets.UTF_8);
  }

  private void write(Map<String, byte[]> contents) throws IOException {
    Path case0 = Files.createDirectories(folder.resolve("case"));
    for (Map.Entry<String, byte[]> e : contents.entrySet()) {
      Files.write(case0.resolve(e.getKey()), e.getValue());
    }
  }

  private Map<String, byte[]> sound() {
    Map<String, byte[]> all = new TreeMap<>();
    files.forEach((k, v) -> all.put(k, v.getBytes(StandardCharsets.UTF_8)));
    return all;
  }

  private void judge(ExitStatus status, String said, Object input) {
    assertThat(said)
        .as("%s", input)
        .doesNotContain("fault of the program itself")
        .doesNotContain("\tat ")
        .doesNotContain("Exception");
    assertThat(status).as("%s: %s", input, said).isIn(ExitStatus.DONE, ExitStatus.INPUT_FAULT);
    if (status == ExitStatus.INPUT_FAULT) {
      assertThat(said).as("%s", input).contains("mend: ");
    }
  }

  @Test
  void soundFiles_areSound() throws IOException {
    write(sound());
    List<String> said = new ArrayList<>();
    assertThat(run(said, "check")).as("%s", said).isEqualTo(ExitStatus.DONE);
    assertThat(run(said, "modes")).as("%s", said).isEqualTo(ExitStatus.DONE);
  }

  /** Bytes changed, lines doubled, dropped and swapped, numbers blown up; seeded. */
  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4, 5, 6})
  void mutatedFiles_areFaultsOrResults_neverMore(long seed) throws IOException {
    Random random = new Random(seed);
    List<String> said = new ArrayList<>();
    for (int k = 0; k < 250; k++) {
      Map<String, byte[]> all = sound();
      String name = new ArrayList<>(all.keySet()).get(random.nextInt(all.size()));
      int times = 1 + random.nextInt(3);
      for (int t = 0; t < times; t++) {
        all.put(name, mutated(all.get(name), random));
      }
      write(all);
      ExitStatus status = run(said, k % 50 == 0 ? "mesh" : "check");
      judge(
          status,
          said.get(said.size() - 1),
          "seed " + seed + " round " + k + " " + name + "\n" + text(all.get(name)));
    }
    try (Stream<Path> there = Files.list(folder)) {
      assertThat(there.map(p -> p.getFileName().toString())).containsOnly("case", "out");
    }
  }

  private static String text(byte[] bytes) {
    return new String(bytes, StandardCharsets.UTF_8);
  }

  private static byte[] mutated(byte[] good, Random random) {
    String[] huge = {
      "1e999", "-1e308", "nan", "1e-320", "0", "-0", "1e9", "٣", "0x1p3", "9".repeat(400)
    };
    List<String> lines =
        new ArrayList<>(Arrays.asList(new String(good, StandardCharsets.UTF_8).split("\n", -1)));
    if (good.length == 0) {
      return good;
    }
    switch (random.nextInt(8)) {
      case 0 -> {
        byte[] bad = good.clone();
        bad[random.nextInt(bad.length)] = (byte) random.nextInt(256);
        return bad;
      }
      case 1 -> {
        return Arrays.copyOf(good, random.nextInt(good.length));
      }
      case 2 -> lines.remove(random.nextInt(lines.size()));
      case 3 -> lines.add(random.nextInt(lines.size()), lines.get(random.nextInt(lines.size())));
      case 4 -> {
        int a = random.nextInt(lines.size());
        int b = random.nextInt(lines.size());
        String swap = lines.get(a);
        lines.set(a, lines.get(b));
        lines.set(b, swap);
      }
      case 5 -> {
        int a = random.nextInt(lines.size());
        lines.set(a, lines.get(a).replaceFirst("[0-9.]+", huge[random.nextInt(huge.length)]));
      }
      case 6 -> {
        int a = random.nextInt(lines.size());
        lines.set(a, lines.get(a) + "�\u0000\u202e");
      }
      default -> {
        int a = random.nextInt(lines.size());
        lines.set(a, "  ".repeat(random.nextInt(5)) + lines.get(a).strip());
      }
    }
    return String.join("\n", lines).getBytes(StandardCharsets.UTF_8);
  }

  @Test
  void bombs_tricksAndRubbish_areFaults() throws IOException {
    StringBuilder bomb = new StringBuilder("a0: &a0 [x, x, x, x, x, x, x, x, x]\n");
    for (int k = 1; k < 12; k++) {
      bomb.append(
          "a" + k + ": &a" + k + " [" + ("*a" + (k - 1) + ", ").repeat(8) + "*a" + (k - 1) + "]\n");
    }
    Map<String, String> tricks = new TreeMap<>();
    tricks.put("aliases", bomb.toString());
    tricks.put("deep", "a: " + "[".repeat(20_000) + "]".repeat(20_000));
    tricks.put("deep maps", "{a: ".repeat(5_000) + "1" + "}".repeat(5_000));
    tricks.put("empty", "");
    tricks.put("binary", "\u0000\u0001\u0002".repeat(1000));
    tricks.put("list", "- 1\n- 2\n");
    tricks.put("long key", "k".repeat(2_000_000) + ": 1\n");
    tricks.put("upward", CASE.replace("flow.csv", "../../etc/passwd"));
    tricks.put("absolute", CASE.replace("flow.csv", "/etc/hostname"));
    tricks.put("folder", CASE.replace("flow.csv", "."));
    tricks.put("tag", "a: !!javax.script.ScriptEngineManager [!!java.net.URLClassLoader []]\n");
    tricks.put("tiny mesh", CASE.replace("mesh_size: 60 mm", "mesh_size: 1e-9 mm"));
    tricks.put("many points", CASE.replace("a: [0 m, 0 m], ", points(20_000) + "a: [0 m, 0 m], "));
    List<String> said = new ArrayList<>();
    for (Map.Entry<String, String> trick : tricks.entrySet()) {
      Map<String, byte[]> all = sound();
      all.put("case.yaml", trick.getValue().getBytes(StandardCharsets.UTF_8));
      write(all);
      ExitStatus status = run(said, "check");
      judge(status, said.get(said.size() - 1), trick.getKey());
      assertThat(status).as(trick.getKey()).isEqualTo(ExitStatus.INPUT_FAULT);
    }
  }

  private static String points(int n) {
    StringBuilder b = new StringBuilder();
    for (int k = 0; k < n; k++) {
      b.append("p").append(k).append(": [1 m, ").append(k).append(" m], ");
    }
    return b.toString();
  }
}
