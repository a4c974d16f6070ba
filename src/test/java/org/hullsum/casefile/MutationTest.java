package org.hullsum.casefile;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.hullsum.problem.Problem;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Cases damaged at random: whatever comes of them, it is a case or problems with places. */
class MutationTest {
  private static final long SEED = 7_341;
  private static final int ROUNDS = 12;
  private static final int MUTANTS = 60;

  /** What is put in: what means something to YAML, to formulas, to units. */
  private static final List<String> PIECES =
      List.of(
          ":",
          ": ",
          ",",
          "[",
          "]",
          "{",
          "}",
          "\"",
          "'",
          "#",
          " #",
          "- ",
          "&a ",
          "*a",
          "!",
          "|\n",
          "> ",
          "%",
          "@",
          "\n",
          "\n  ",
          "\t",
          "~",
          "null",
          "none",
          "true",
          "0",
          "-1",
          "1e308",
          "1e-320",
          "/0",
          "^",
          "^-999",
          "(",
          ")",
          "±",
          "+/- ",
          "(k=2)",
          " m",
          " kg",
          " degC",
          "[in_i]",
          "é",
          "\uD83D\uDCA7",
          "x",
          "t",
          "if(",
          "sin",
          "sqrt(-1)",
          "nan",
          "inf",
          "\\",
          "<<: {}",
          "radius",
          "basin",
          "{file: a.csv}",
          "surroundings",
          "outward",
          "--- ",
          "\u0000",
          "\u0085");

  static Stream<Integer> rounds() {
    return IntStream.range(0, ROUNDS).boxed();
  }

  @ParameterizedTest
  @MethodSource("rounds")
  void damagedCaseIsACaseOrProblemsWithPlaces(int round) throws IOException {
    Random random = new Random(SEED + round);
    List<String> sources = new ArrayList<>(DocumentationTest.examples());
    sources.replaceAll(CaseTexts::completed);
    sources.add(CaseTexts.goodCase());
    for (int i = 0; i < MUTANTS; i++) {
      String source = sources.get(random.nextInt(sources.size()));
      String mutant = mutated(source, 1 + random.nextInt(3), random);
      ReadOutcome outcome;
      try {
        outcome = CaseTexts.read(mutant);
      } catch (RuntimeException | StackOverflowError e) {
        throw new AssertionError(
            "seed " + SEED + ", round " + round + ", mutant " + i + ":\n" + mutant, e);
      }
      assertEquals(outcome.found().isPresent(), outcome.problems().isEmpty());
      for (Problem problem : outcome.problems()) {
        assertEquals(CaseTexts.NAME, problem.place().file(), problem::toString);
        assertTrue(problem.place().line() <= mutant.lines().count() + 1, problem::toString);
        assertTrue(!problem.message().isBlank() && problem.message().length() < 1000);
      }
    }
  }

  private static String mutated(String source, int changes, Random random) {
    StringBuilder text = new StringBuilder(source);
    for (int i = 0; i < changes; i++) {
      int at = random.nextInt(text.length());
      int end = Math.min(text.length(), at + random.nextInt(6));
      switch (random.nextInt(4)) {
        case 0 -> text.delete(at, end);
        case 1 -> text.insert(at, PIECES.get(random.nextInt(PIECES.size())));
        case 2 -> text.replace(at, end, PIECES.get(random.nextInt(PIECES.size())));
        default -> {
          int from = random.nextInt(text.length());
          text.insert(at, text.substring(from, Math.min(text.length(), from + 20)));
        }
      }
    }
    return text.toString();
  }
}
