package org.annulet.cases.read;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/** The user's guide keeps its promises. */
class GuideTest {
  private static final Path GUIDE = ShippedCasesTest.CASES.resolve("README.md");

  @TempDir Path folder;

  @Test
  void wholeCaseOfTheGuide_readsWithoutFault() throws IOException {
    Matcher m =
        Pattern.compile("```yaml\\R(annulet: 1.*?)```", Pattern.DOTALL)
            .matcher(Files.readString(GUIDE));
    assertThat(m.find()).isTrue();
    Reading r = CaseReader.read(Files.writeString(folder.resolve("case.yaml"), m.group(1)));
    assertThat(r.problems()).isEmpty();
    assertThat(r.cautions()).isEmpty();
  }

  @ParameterizedTest
  @EnumSource(CaseKeys.class)
  void everyKey_standsInTheGuide(CaseKeys keys) throws IOException {
    String guide = Files.readString(GUIDE);
    assertThat(keys.all()).allSatisfy(k -> assertThat(guide).containsPattern("\\b" + k + "\\b"));
  }
}
