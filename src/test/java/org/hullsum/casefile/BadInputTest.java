package org.hullsum.casefile;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import org.hullsum.model.Case;
import org.hullsum.problem.Place;
import org.hullsum.problem.Problem;
import org.hullsum.problem.ProblemKind;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Files that are no cases at all, and those made to hurt: each gives a problem, and soon. */
@Timeout(20)
class BadInputTest {
  private static Problem only(ReadOutcome outcome) {
    assertEquals(1, outcome.problems().size(), () -> CaseTexts.problems(outcome));
    return outcome.problems().get(0);
  }

  private static Problem only(String text) {
    return only(CaseTexts.read(text));
  }

  private static Problem only(byte[] bytes) {
    return only(CaseTexts.read(bytes, ReadOptions.named(CaseTexts.NAME)));
  }

  @Test
  void missingFileIsUnreadable(@TempDir Path folder) {
    Problem problem =
        only(CaseReader.read(folder.resolve("no.yaml"), ReadOptions.named("no.yaml")));

    assertEquals(ProblemKind.FILE_UNREADABLE, problem.kind());
    assertEquals(Place.wholeFile("no.yaml"), problem.place());
  }

  @Test
  void folderIsUnreadable(@TempDir Path folder) {
    Problem problem = only(CaseReader.read(folder, ReadOptions.named("folder")));

    assertEquals(ProblemKind.FILE_UNREADABLE, problem.kind());
    assertTrue(problem.message().contains("folder"));
  }

  @ParameterizedTest
  @ValueSource(strings = {"", " \n\n", "\uFEFF", "# nothing but a comment\n", "---\n"})
  void emptyFileIsToldHowACaseBegins(String text) {
    Problem problem = only(text);

    assertTrue(problem.message().contains("format: hullsum-case/1"), problem::toString);
  }

  @Test
  void binaryFileIsNoText() {
    byte[] bytes = new byte[4096];
    for (int i = 0; i < bytes.length; i++) {
      bytes[i] = (byte) (31 * i);
    }

    assertEquals(ProblemKind.NOT_TEXT, only(bytes).kind());
  }

  @Test
  void latin1IsRefusedAtItsFirstOddByte() {
    Problem problem = only("format: é".getBytes(StandardCharsets.ISO_8859_1));

    assertEquals(ProblemKind.NOT_TEXT, problem.kind());
    assertEquals(new Place(CaseTexts.NAME, 1, 9), problem.place());
  }

  @Test
  void nulCharacterIsRefusedAtItsPlace() {
    Problem problem = only("format: x\n\0");

    assertEquals(ProblemKind.NOT_TEXT, problem.kind());
    assertEquals(new Place(CaseTexts.NAME, 2, 1), problem.place());
  }

  @Test
  void byteOrderMarkIsNoPartOfTheText() {
    ReadOutcome outcome = CaseTexts.read("\uFEFF" + CaseTexts.goodCase());

    assertTrue(outcome.found().isPresent(), () -> CaseTexts.problems(outcome));
  }

  @Test
  void linesMayEndInTheFashionOfOtherSystems() {
    ReadOutcome outcome =
        CaseTexts.read(CaseTexts.goodCase().replace("4.0 m\n", "4.0 mtr\n").replace("\n", "\r\n"));

    assertEquals(new Place(CaseTexts.NAME, 8, 15), only(outcome).place());
  }

  /** A text that YAML reads otherwise than it was meant. */
  private record Trap(String text, int line, int column, String said) {}

  static List<Trap> traps() {
    return List.of(
        new Trap("a: 1\n\tb: 2", 2, 1, "a tab stands in the indentation"),
        new Trap("title: T: x", 1, 9, "must be quoted"),
        new Trap("p: {a: *3}", 1, 8, "begins with `*`"),
        new Trap("a: *3", 1, 4, "begins with `*`"),
        new Trap("a: &b + 2", 1, 4, "begins with `&`"),
        new Trap("a: !x + 2", 1, 4, "begins with `!`"),
        new Trap("a: %5", 1, 4, "begins with `%`"),
        new Trap("a: @5", 1, 4, "begins with `@`"),
        new Trap("a: |x|", 1, 5, "begins with `|`"),
        new Trap("a: > 5", 1, 6, "begins with `>`"),
        new Trap("a: - x", 1, 4, "begins with `- `"),
        new Trap("quantity:mass\nunits: none", 2, 6, "a blank is missing after `quantity:`"),
        new Trap("a: [1, 2", 1, 9, "left open"),
        new Trap("a: \"open\nb: 1\n", 3, 1, "the quote that opens on line 1"),
        new Trap("a: 1\n---\nb: 1", 2, 1, "a second one begins"));
  }

  @ParameterizedTest
  @MethodSource("traps")
  void textThatYamlReadsOtherwiseIsAnsweredWithAHint(Trap trap) {
    Problem problem = only(trap.text());

    assertEquals(ProblemKind.SYNTAX, problem.kind());
    assertEquals(
        new Place(CaseTexts.NAME, trap.line(), trap.column()), problem.place(), problem::toString);
    assertTrue(problem.message().contains(trap.said()), problem::toString);
  }

  @Test
  void listIsNoCase() {
    assertEquals(ProblemKind.WRONG_TYPE, only("- a\n- b\n").kind());
  }

  @Test
  void keyGluedToItsValueIsNamedWhereItStandsAlone() {
    Problem problem = only("format:hullsum-case/1");

    assertTrue(problem.message().contains("a blank is missing after `format:`"), problem::toString);
  }

  @Test
  void aliasBombIsRefusedForWhatItStandsFor() {
    StringBuilder text = new StringBuilder("a: &a [x, x, x, x, x, x, x, x, x]\n");
    for (char c = 'b'; c < 'm'; c++) {
      String before = "*" + (char) (c - 1);
      text.append(c).append(": &").append(c).append(" [").append(before);
      text.append((", " + before).repeat(7)).append("]\n");
    }
    text.append("z: *l\n");

    assertEquals(ProblemKind.LIMIT_EXCEEDED, only(text.toString()).kind());
  }

  @Test
  void aliasesWithoutNumberAreRefused() {
    String text = "a: &a [x]\nb:\n" + "  - *a\n".repeat(5000);

    assertEquals(ProblemKind.LIMIT_EXCEEDED, only(text).kind());
  }

  @Test
  void valueThatHoldsItselfIsRefused() {
    Problem problem = only(CaseTexts.goodCase().replace("[rising, turning]", "&a [rising, *a]"));

    assertEquals(ProblemKind.WRONG_VALUE, problem.kind());
  }

  @Test
  void anchorsAndAliasesWork() {
    String text =
        CaseTexts.goodCase()
            .replace("normal: [0, 0, 1], radius: radius", "normal: &up [0, 0, 1], radius: radius")
            .replace("normal: [1, 0, 0]", "normal: *up");

    assertTrue(CaseTexts.read(text).found().isPresent());
  }

  @Test
  void tenMegabytesOfNestingAreRefused() {
    assertEquals(ProblemKind.LIMIT_EXCEEDED, only("a: " + "[".repeat(10_000_000)).kind());
  }

  @Test
  void nestingIsRefusedAtTheLevelThatIsTooDeep() {
    Problem problem = only("a: " + "[\n".repeat(100_000));

    assertEquals(ProblemKind.LIMIT_EXCEEDED, problem.kind());
    assertEquals(BoundedParser.DEEPEST, problem.place().line());
  }

  @Test
  void expressionOfAMillionParenthesesIsRefused() {
    String text = CaseTexts.goodCase().replace("4.0 m\n", "(".repeat(1_000_000) + "\n");

    assertEquals(ProblemKind.LIMIT_EXCEEDED, only(text).kind());
  }

  @Test
  void expressionOfManyParenthesesOnManyLinesIsRefused() {
    String parentheses =
        IntStream.range(0, 1000)
            .mapToObj(i -> "    " + "(".repeat(1000))
            .collect(Collectors.joining("\n"));
    String text = CaseTexts.goodCase().replace("4.0 m\n", "\n" + parentheses + "\n");

    ReadOutcome outcome = CaseTexts.read(text);

    assertEquals(ProblemKind.LIMIT_EXCEEDED, only(outcome).kind());
  }

  @ParameterizedTest
  @ValueSource(strings = {"1e999", ".inf", "1 m/0", "0/0", "inf", "nan", "-1e400 m"})
  void numbersThatAreNotFiniteAreRefused(String number) {
    Problem problem = only(CaseTexts.goodCase().replace("4.0 m\n", number + "\n"));

    assertEquals(8, problem.place().line(), problem::toString);
  }

  @Test
  void longChainOfParametersIsReadWithoutRecursion() {
    StringBuilder text = new StringBuilder("parameters:\n");
    for (int i = 3000; i > 0; i--) {
      text.append("  p").append(i).append(": p").append(i - 1).append(" + 1\n");
    }
    text.append("  p0: 0\n");

    Case found = CaseTexts.good(CaseTexts.completed(text.toString()));

    assertEquals(3000.0, found.inputs().all().get("p3000").value());
  }

  @Test
  void longChainOfFieldsIsRefused() {
    StringBuilder text = new StringBuilder("fields:\n");
    for (int i = 20_000; i > 0; i--) {
      text.append("  f").append(i).append(": {sum: [f").append(i - 1).append("]}\n");
    }
    text.append("  f0: {vector: [1, 0, 0], unit: m/s}\n");

    ReadOutcome outcome = CaseTexts.read(CaseTexts.completed(text.toString()));

    assertEquals(ProblemKind.LIMIT_EXCEEDED, outcome.problems().get(0).kind());
  }

  @Test
  void moreProblemsThanAnyoneReadsAreCounted() {
    StringBuilder text = new StringBuilder("parameters:\n");
    for (int i = 0; i < 20_000; i++) {
      text.append("  p").append(i).append(": nothing").append(i).append("\n");
    }

    List<Problem> problems = CaseTexts.read(CaseTexts.completed(text.toString())).problems();

    assertEquals(ProblemAccumulator.MOST_TOLD + 1, problems.size());
    assertTrue(problems.get(problems.size() - 1).message().contains("more problems"));
  }
}
