package org.annulet.cases.read;

import static org.assertj.core.api.Assertions.assertThat;

import com.networknt.schema.Error;
import com.networknt.schema.InputFormat;
import com.networknt.schema.Schema;
import com.networknt.schema.SchemaRegistry;
import com.networknt.schema.SpecificationVersion;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.TreeSet;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.MethodSource;
import tools.jackson.databind.JsonNode;

/** The JSON Schema and the reader say the same; the validator is the general networknt library. */
class CaseSchemaTest {
  private static final Schema SCHEMA = schema();

  private static Schema schema() {
    try (InputStream in =
        CaseKeys.class.getResourceAsStream("/org/annulet/cases/case.schema.json")) {
      return SchemaRegistry.withDefaultDialect(SpecificationVersion.DRAFT_2020_12)
          .getSchema(in, InputFormat.JSON);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private static List<Error> errors(String yaml) {
    return SCHEMA.validate(yaml, InputFormat.YAML);
  }

  static List<Path> shippedCases() throws IOException {
    try (Stream<Path> folders = Files.list(ShippedCasesTest.CASES)) {
      return folders
          .map(f -> f.resolve(CaseReader.FILE_NAME))
          .filter(Files::exists)
          .sorted()
          .toList();
    }
  }

  @ParameterizedTest
  @MethodSource("shippedCases")
  void shippedCase_fitsTheSchema(Path file) throws IOException {
    assertThat(errors(Files.readString(file))).isEmpty();
  }

  @Test
  void whatTheReaderAccepts_fitsTheSchema() {
    assertThat(errors(Spoilt.RING)).isEmpty();
    assertThat(errors(Spoilt.SECTION)).isEmpty();
    for (String example : ReadingCasesTest.accepted()) {
      assertThat(errors(example)).as(example).isEmpty();
    }
  }

  /** Unknown or missing keys and wrong words are seen by the schema too. */
  static Stream<Spoilt> faultsOfForm() {
    return BrokenCasesTest.spoilt()
        .filter(
            s ->
                s.what()
                        .matches(
                            "unknown key.*|the key '\\w+' is missing|.* is not one of the words.*")
                    || s.what()
                        .matches(".*has no unit.*|one of these keys.*|.*exclude each other.*"));
  }

  @ParameterizedTest
  @MethodSource("faultsOfForm")
  void faultOfForm_isSeenByTheSchema(Spoilt s) {
    assertThat(errors(s.base().replace(s.old(), s.by()))).isNotEmpty();
  }

  @Test
  void faultsOfForm_areMany() {
    assertThat(faultsOfForm().count()).isGreaterThan(12);
  }

  @ParameterizedTest
  @EnumSource(CaseKeys.class)
  void keysOfReaderAndSchema_agree(CaseKeys keys) {
    JsonNode definition = SCHEMA.getSchemaNode().path("$defs").path(keys.definition());
    assertThat(new TreeSet<>(definition.path("properties").propertyNames()))
        .as(keys.definition())
        .isEqualTo(new TreeSet<>(keys.all()));
    List<String> required = new ArrayList<>();
    definition.path("required").forEach(n -> required.add(n.asString()));
    assertThat(required).containsExactlyInAnyOrderElementsOf(keys.required());
    assertThat(definition.path("additionalProperties").asBoolean(true)).isFalse();
  }
}
