package org.annulet.mesher.files;

import static org.assertj.core.api.Assertions.assertThat;
import static org.junit.jupiter.api.Assertions.assertTimeoutPreemptively;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.mesher.mesh.MeshCheck;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * 2,400 damaged MSH files of both versions, text and binary, seeded: each is a fault with a remedy
 * or a sound mesh; never another exception, never more memory than the file justifies, never a
 * wait.
 */
class MshFuzzTest {
  private static final int ROUNDS = 600;

  /** A safety net for all rounds of one encoding, not a measure of speed. */
  private static final Duration LONGEST = Duration.ofSeconds(60);

  private static final String[] WORDS = {
    "1e999",
    "-1e308",
    "nan",
    "1e-320",
    "0",
    "-0",
    "-1",
    "2147483647",
    "2147483648",
    "1e9",
    "٣",
    "0x1p3",
    "99999999999999999999",
    "$EndNodes",
    "$Nodes",
    "\"",
    ""
  };
  private static final long[] INTEGERS = {
    0, 1, -1, 3, 15, Integer.MAX_VALUE, Integer.MIN_VALUE, Long.MAX_VALUE, Long.MIN_VALUE, 1L << 40
  };
  private static final double[] REALS = {
    Double.NaN, Double.POSITIVE_INFINITY, -Double.MAX_VALUE, Double.MIN_VALUE, 0, 1e9
  };

  @TempDir Path dir;

  @ParameterizedTest
  @CsvSource({"msh22,0", "msh22,1", "msh41,0", "msh41,1"})
  void damagedFile_isAFaultWithARemedy_orASoundMesh(String format, int binary) throws Exception {
    byte[] whole = Files.readAllBytes(made(format, binary));
    Random random = new Random(41L * format.hashCode() + binary);
    int[] tally = new int[2];
    Path damaged = dir.resolve("damaged.msh");
    assertTimeoutPreemptively(
        LONGEST,
        () -> {
          for (int k = 0; k < ROUNDS; k++) {
            byte[] bytes = whole;
            for (int t = random.nextInt(3); t >= 0; t--) {
              bytes =
                  binary == 1 && random.nextInt(4) > 0
                      ? words(bytes, random)
                      : lines(bytes, random);
            }
            Files.write(damaged, bytes);
            judge(damaged, format + " round " + k, tally);
          }
        });
    assertThat(tally[0]).as("refused").isGreaterThan(ROUNDS / 4);
    assertThat(tally[1]).as("read").isPositive();
  }

  private static void judge(Path file, String round, int[] tally) throws IOException {
    try {
      Mesh mesh = GmshReader.read(file, ImportOptions.standard());
      assertThat(MeshCheck.tiling(mesh)).as(round).isEmpty();
      tally[1]++;
    } catch (MeshFileException e) {
      assertThat(e.getMessage()).as(round).contains("mend: ").hasSizeLessThan(2000);
      tally[0]++;
    }
  }

  private Path made(String format, int binary) throws IOException, InterruptedException {
    Programs.assume("gmsh");
    Path geo = dir.resolve("chamber.geo");
    Files.writeString(geo, GmshFilesTest.DRAWING.replace("h = 0.02", "h = 0.06"));
    Path msh = dir.resolve("chamber.msh");
    Programs.run(
        "gmsh",
        "-2",
        "-v",
        "1",
        geo.toString(),
        "-format",
        format,
        "-setnumber",
        "Mesh.Binary",
        Integer.toString(binary),
        "-o",
        msh.toString());
    return msh;
  }

  /** Lines dropped, doubled, swapped or cut, and words replaced by hard ones. */
  private static byte[] lines(byte[] good, Random random) {
    List<String> lines =
        new ArrayList<>(
            Arrays.asList(new String(good, StandardCharsets.ISO_8859_1).split("\n", -1)));
    int at = random.nextInt(lines.size());
    switch (random.nextInt(6)) {
      case 0 -> lines.remove(at);
      case 1 -> lines.add(at, lines.get(random.nextInt(lines.size())));
      case 2 -> lines.set(at, lines.get(random.nextInt(lines.size())));
      case 3 -> lines.subList(at, lines.size()).clear();
      default -> {
        String[] words = lines.get(at).split(" ", -1);
        words[random.nextInt(words.length)] = WORDS[random.nextInt(WORDS.length)];
        lines.set(at, String.join(" ", words));
      }
    }
    return String.join("\n", lines).getBytes(StandardCharsets.ISO_8859_1);
  }

  /** Numbers overwritten by extreme ones, bytes flipped, dropped or doubled. */
  private static byte[] words(byte[] good, Random random) {
    if (good.length < 64) {
      return good;
    }
    byte[] bytes = good.clone();
    ByteBuffer buffer = ByteBuffer.wrap(bytes).order(ByteOrder.LITTLE_ENDIAN);
    int at = random.nextInt(bytes.length - 40);
    switch (random.nextInt(6)) {
      case 0 -> buffer.putInt(at, (int) INTEGERS[random.nextInt(INTEGERS.length)]);
      case 1 -> buffer.putLong(at, INTEGERS[random.nextInt(INTEGERS.length)]);
      case 2 -> buffer.putDouble(at, REALS[random.nextInt(REALS.length)]);
      case 3 -> bytes[at] ^= (byte) (1 << random.nextInt(8));
      case 4 -> {
        int span = 1 + random.nextInt(32);
        byte[] less = new byte[bytes.length - span];
        System.arraycopy(bytes, 0, less, 0, at);
        System.arraycopy(bytes, at + span, less, at, bytes.length - at - span);
        return less;
      }
      default -> {
        int span = 1 + random.nextInt(32);
        byte[] more = Arrays.copyOf(bytes, bytes.length + span);
        System.arraycopy(bytes, at, more, at + span, bytes.length - at);
        return more;
      }
    }
    return bytes;
  }
}
