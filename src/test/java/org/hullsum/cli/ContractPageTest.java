package org.hullsum.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Set;
import java.util.TreeSet;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.hullsum.problem.FindingCode;
import org.junit.jupiter.api.Test;

/** What {@code docs/results.md} says of commands, options and codes is what the program has. */
class ContractPageTest {
  private static String page() throws IOException {
    return Files.readString(Path.of("docs", "results.md"));
  }

  private static Set<String> found(String pattern, String text) {
    Set<String> found = new TreeSet<>();
    Matcher matcher = Pattern.compile(pattern, Pattern.MULTILINE).matcher(text);
    while (matcher.find()) {
      found.add(matcher.group(1));
    }
    return found;
  }

  @Test
  void theOptionsOfThePageAreThoseOfTheHelp() throws IOException {
    String help = ProgramRun.of(HandmadeCases::run, "audit", "-h").out();
    Set<String> shown = found("^ +(--[a-z-]+)", help);
    shown.remove("--version");
    assertEquals(shown, found("^\\| `(--[a-z-]+)", page()));
  }

  @Test
  void theCommandsOfThePageAreThoseOfTheHelp() throws IOException {
    String help = ProgramRun.of(HandmadeCases::run, "-h").out();
    assertEquals(
        found("^  ([a-z]+) ", help.substring(help.indexOf("Commands:"))),
        found("^\\| `hullsum ([a-z]+)", page()));
  }

  @Test
  void theExitCodesOfThePageAreThoseOfTheProgram() throws IOException {
    Set<String> codes = new TreeSet<>();
    for (ExitCode code : ExitCode.values()) {
      codes.add(Integer.toString(code.status()));
    }
    assertEquals(codes, found("^\\| (\\d+) \\|", page()));
  }

  @Test
  void theFindingCodesOfThePageAreThoseOfTheProgram() throws IOException {
    String page = page();
    String section = page.substring(page.indexOf("## Finding codes"));
    String list = section.substring(0, section.indexOf("What is wrong with the file"));
    Set<String> codes = new TreeSet<>();
    for (FindingCode code : FindingCode.values()) {
      codes.add(code.code());
    }
    assertEquals(codes, found("`([a-z-]+)`", list));
  }
}
