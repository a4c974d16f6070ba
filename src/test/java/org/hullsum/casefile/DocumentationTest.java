package org.hullsum.casefile;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Every example of the format's page, and every case that is shipped, is read without a warning.
 */
class DocumentationTest {
  private static final Path PAGE = Path.of("docs/case-format.md");
  private static final Path CASES = Path.of("cases");
  private static final Pattern EXAMPLE = Pattern.compile("```yaml\n(.*?)```", Pattern.DOTALL);

  static List<String> examples() throws IOException {
    List<String> examples = new ArrayList<>();
    Matcher matcher = EXAMPLE.matcher(Files.readString(PAGE));
    while (matcher.find()) {
      examples.add(matcher.group(1));
    }
    return examples;
  }

  static List<Path> cases() throws IOException {
    try (Stream<Path> files = Files.list(CASES)) {
      return files.filter(f -> f.toString().endsWith(".yaml")).sorted().toList();
    }
  }

  @Test
  void pageHasAnExampleForEachOfItsParts() throws IOException {
    assertTrue(examples().size() >= 9, "only " + examples().size() + " examples");
  }

  @ParameterizedTest
  @MethodSource("examples")
  void exampleIsReadWithoutAWarning(String example) {
    assertEquals(List.of(), CaseTexts.good(CaseTexts.completed(example)).warnings());
  }

  @Test
  void everyKeyOfTheFormatIsOnThePage() throws IOException {
    String page = Files.readString(PAGE);
    Set<String> missing = new TreeSet<>();
    for (Section section : Section.values()) {
      Stream.concat(section.keys().stream(), section.notYet().stream())
          .filter(key -> !page.contains(key))
          .forEach(missing::add);
    }
    assertEquals(Set.of(), missing);
  }

  @Test
  void thereAreCases() throws IOException {
    assertTrue(cases().size() >= 10, "only " + cases().size() + " cases");
  }

  @ParameterizedTest
  @MethodSource("cases")
  void shippedCaseIsReadWithoutAWarning(Path file) {
    ReadOutcome outcome = CaseReader.read(file, ReadOptions.named(file.toString()));

    assertTrue(outcome.found().isPresent(), () -> CaseTexts.problems(outcome));
    assertEquals(List.of(), outcome.found().get().warnings());
  }
}
