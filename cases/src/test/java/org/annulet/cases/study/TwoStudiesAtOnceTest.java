package org.annulet.cases.study;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.Callable;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import org.annulet.cases.read.CaseFile;
import org.annulet.post.table.ModesJson;
import org.annulet.post.table.PointsCsv;
import org.annulet.post.table.SensitivitiesCsv;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Studies share a Java machine without a trace of one another. */
class TwoStudiesAtOnceTest {
  private static String results(CaseFile caseFile) {
    var results = new ModesStudy(caseFile, Progress.SILENT).run("test").results();
    return ModesJson.text(results) + SensitivitiesCsv.text(results) + PointsCsv.text(results);
  }

  /** To the last printed digit, three rounds, both orders of start. */
  @Test
  void ductAndRing_solvedTogether_giveTheSameBytesAsAlone(@TempDir Path folder) throws Exception {
    List<CaseFile> cases = cases(folder);
    List<String> alone = cases.stream().map(TwoStudiesAtOnceTest::results).toList();
    assertThat(alone.get(0)).isNotEqualTo(alone.get(1)).contains("\"complete\": true");
    ExecutorService two = Executors.newFixedThreadPool(2);
    try {
      for (int round = 0; round < 3; round++) {
        List<Callable<String>> work = new ArrayList<>();
        for (int k = 0; k < 2; k++) {
          CaseFile c = cases.get((k + round) % 2);
          work.add(() -> results(c));
        }
        List<Future<String>> done = two.invokeAll(work);
        for (int k = 0; k < 2; k++) {
          assertThat(done.get(k).get()).as("round " + round).isEqualTo(alone.get((k + round) % 2));
        }
      }
    } finally {
      two.shutdown();
    }
  }

  private static List<CaseFile> cases(Path folder) throws IOException {
    return List.of(SmallCases.duct(folder), SmallCases.ring(folder));
  }
}
