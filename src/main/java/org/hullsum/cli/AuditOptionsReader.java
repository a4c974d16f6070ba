package org.hullsum.cli;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.audit.AuditOptions;
import picocli.CommandLine;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Model.OptionSpec;
import picocli.CommandLine.Model.PositionalParamSpec;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.ParseResult;

/** The options of {@code hullsum audit}: their declaration, and the request that they make. */
final class AuditOptionsReader {
  private static final int MOST_THREADS = 1024;

  private final CommandLine command;
  private final ParseResult parsed;
  private final AuditRequest usual;

  private AuditOptionsReader(CommandLine command, ParseResult parsed) {
    this.command = command;
    this.parsed = parsed;
    this.usual = AuditRequest.usual(parsed.matchedPositionalValue(0, List.of()));
  }

  static CommandSpec declare() {
    CommandSpec spec = CommandSpec.create();
    spec.usageMessage()
        .description(
            "Reads the cases, integrates and sums what flows through each closed surface, and says"
                + " whether it balances.")
        .footer(
            "Exit codes: 0 balanced, 10 imbalanced or an error found, 20 undecided, 64 wrong command"
                + " line, 65 wrong input, 70 fault of the program, 74 output can't be written.");
    spec.addPositional(
        PositionalParamSpec.builder()
            .paramLabel("CASE")
            .arity("1..*")
            .required(true)
            .type(List.class)
            .auxiliaryTypes(String.class)
            .description("Case files, format hullsum-case/1.")
            .build());
    spec.addOption(
        text("--json", "FILE", "Writes the result document; - is standard output.").build());
    spec.addOption(
        text("--junit", "FILE", "Writes the verdicts as JUnit XML; - is standard output.").build());
    spec.addOption(
        repeated("--set", "NAME=VALUE", "Gives a parameter of the cases another value.").build());
    spec.addOption(
        number("--threads", "Works on N threads; by default as many as there are processors."));
    spec.addOption(
        number(
            "--digits",
            "Integrates to 10^-N of what flows, 1 to "
                + AuditOptions.MOST_DIGITS
                + "; default "
                + AuditOptions.USUAL_DIGITS
                + "."));
    spec.addOption(
        repeated("--allow-outside", "DIR", "Lets data files lie in DIR, outside the case's folder.")
            .build());
    spec.addOption(
        flag("--second-opinion", "Asks winding numbers, too, which way every patch faces."));
    spec.addOption(flag("--no-progress", "Prints no progress line."));
    spec.addOption(flag("--quiet", "Prints one line per balance instead of the report."));
    return spec;
  }

  private static OptionSpec.Builder text(String name, String label, String description) {
    return OptionSpec.builder(name)
        .paramLabel(label)
        .arity("1")
        .type(String.class)
        .description(description);
  }

  private static OptionSpec.Builder repeated(String name, String label, String description) {
    return text(name, label, description).type(List.class).auxiliaryTypes(String.class);
  }

  private static OptionSpec number(String name, String description) {
    return text(name, "N", description).type(Integer.class).build();
  }

  private static OptionSpec flag(String name, String description) {
    return OptionSpec.builder(name).arity("0").type(boolean.class).description(description).build();
  }

  /**
   * The request that was parsed.
   *
   * @throws ParameterException with a message for people, if a value is out of its range
   */
  static AuditRequest read(CommandLine command, ParseResult parsed) {
    return new AuditOptionsReader(command, parsed).request();
  }

  private AuditRequest request() {
    Optional<String> json = Optional.ofNullable(parsed.matchedOptionValue("--json", null));
    Optional<String> junit = Optional.ofNullable(parsed.matchedOptionValue("--junit", null));
    if (json.isPresent() && json.equals(junit)) {
      throw fault("--json and --junit both write to " + json.get() + "; give them two places");
    }
    for (Optional<String> document : List.of(json, junit)) {
      document.ifPresent(this::refuseCase);
    }
    return new AuditRequest(
        usual.cases(),
        json,
        junit,
        parameters(),
        allowedFolders(),
        threads(),
        digits(),
        !parsed.hasMatchedOption("--no-progress"),
        parsed.hasMatchedOption("--quiet"),
        parsed.hasMatchedOption("--second-opinion"));
  }

  /** A document is not written over a case that is to be read. */
  private void refuseCase(String document) {
    if (usual.cases().stream().anyMatch(name -> isSame(name, document))) {
      throw fault(document + " is a case of this audit; write the document elsewhere");
    }
  }

  /** Whether two names are of one file; what can't be read is told where it is read. */
  private static boolean isSame(String name, String document) {
    try {
      return Files.exists(Path.of(document)) && Files.isSameFile(Path.of(name), Path.of(document));
    } catch (IOException | InvalidPathException e) {
      return false;
    }
  }

  private Map<String, String> parameters() {
    Map<String, String> parameters = new LinkedHashMap<>();
    for (String setting : parsed.matchedOptionValue("--set", List.<String>of())) {
      int equals = setting.indexOf('=');
      if (equals < 1 || equals == setting.length() - 1) {
        throw fault("--set takes NAME=VALUE, such as --set radius='4 m', not '" + setting + "'");
      }
      String name = setting.substring(0, equals).strip();
      if (parameters.putIfAbsent(name, setting.substring(equals + 1).strip()) != null) {
        throw fault("--set gives " + name + " twice");
      }
    }
    return parameters;
  }

  private List<Path> allowedFolders() {
    List<Path> folders = new ArrayList<>();
    for (String name : parsed.matchedOptionValue("--allow-outside", List.<String>of())) {
      try {
        Path folder = Path.of(name);
        if (!Files.isDirectory(folder)) {
          throw fault("--allow-outside takes a folder, and '" + name + "' is none");
        }
        folders.add(folder);
      } catch (InvalidPathException e) {
        throw fault("--allow-outside takes a folder, and '" + name + "' can't be one");
      }
    }
    return folders;
  }

  private int threads() {
    int threads = parsed.matchedOptionValue("--threads", usual.threads());
    if (threads < 1 || threads > MOST_THREADS) {
      throw fault("--threads takes a number from 1 to " + MOST_THREADS + ", not " + threads);
    }
    return threads;
  }

  private int digits() {
    int digits = parsed.matchedOptionValue("--digits", usual.digits());
    if (digits < 1 || digits > AuditOptions.MOST_DIGITS) {
      throw fault(
          "--digits takes a number from 1 to " + AuditOptions.MOST_DIGITS + ", not " + digits);
    }
    return digits;
  }

  private ParameterException fault(String message) {
    return new ParameterException(command, message);
  }
}
