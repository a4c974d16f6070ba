package org.hullsum.casefile;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;

import com.networknt.schema.Schema;
import com.networknt.schema.SchemaRegistry;
import com.networknt.schema.SpecificationVersion;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Stream;
import org.hullsum.problem.FindingCode;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.snakeyaml.engine.v2.api.Load;
import org.snakeyaml.engine.v2.api.LoadSettings;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.ObjectMapper;

/** The schema against the cases, the page, the faults, and the keys that the reader knows. */
class CaseSchemaTest {
  /**
   * Faults of the structure that a schema does not see: YAML's own, and those that need context.
   */
  private static final Set<String> BEYOND_A_SCHEMA =
      Set.of("duplicate key", "duplicate patch", "missing unit");

  private static final ObjectMapper MAPPER = new ObjectMapper();
  private static final JsonNode TREE = MAPPER.readTree(CaseSchema.text());
  private static final Schema SCHEMA =
      SchemaRegistry.withDefaultDialect(SpecificationVersion.DRAFT_2020_12)
          .getSchema(CaseSchema.text());

  private static List<String> faults(String yaml) {
    Object value = new Load(LoadSettings.builder().build()).loadFromString(yaml);
    return SCHEMA.validate(MAPPER.<JsonNode>valueToTree(value)).stream()
        .map(Object::toString)
        .toList();
  }

  static List<Path> cases() throws IOException {
    return DocumentationTest.cases();
  }

  static List<String> examples() throws IOException {
    return DocumentationTest.examples();
  }

  static Stream<OneFaultTest.Fault> structuralFaults() {
    return OneFaultTest.structure().stream().filter(f -> !BEYOND_A_SCHEMA.contains(f.name()));
  }

  @ParameterizedTest
  @MethodSource("cases")
  void shippedCaseIsAccepted(Path file) throws IOException {
    assertEquals(List.of(), faults(Files.readString(file)));
  }

  @ParameterizedTest
  @MethodSource("examples")
  void exampleOfThePageIsAccepted(String example) {
    assertEquals(List.of(), faults(CaseTexts.completed(example)));
  }

  @Test
  void goodCaseIsAccepted() {
    assertEquals(List.of(), faults(CaseTexts.goodCase()));
  }

  @ParameterizedTest
  @MethodSource("structuralFaults")
  void structuralFaultIsRefused(OneFaultTest.Fault fault) {
    String broken =
        CaseTexts.goodCase()
            .replace(fault.found(), fault.replacement())
            .replace(OneFaultTest.MARK, "");

    assertFalse(faults(broken).isEmpty());
  }

  @ParameterizedTest
  @MethodSource("sections")
  void schemaKnowsTheKeysThatTheReaderKnows(Section section) {
    String name = section.name().toLowerCase(Locale.ROOT);
    JsonNode properties = TREE.path("$defs").path(name).path("properties");

    assertEquals(section.keys(), new TreeSet<>(properties.propertyNames()));
  }

  static List<Section> sections() {
    List<Section> sections = new ArrayList<>(Arrays.asList(Section.values()));
    sections.removeIf(s -> s.keys().isEmpty());
    return sections;
  }

  @Test
  void schemaKnowsTheFindingsThatCanBeWaived() {
    List<String> codes = new ArrayList<>();
    TREE.at("/$defs/waiver/properties/finding/enum").forEach(n -> codes.add(n.asString()));

    assertEquals(Arrays.stream(FindingCode.values()).map(FindingCode::code).toList(), codes);
  }
}
