package org.hullsum.cli;

import java.io.OutputStream;
import java.time.Clock;
import java.util.List;
import org.hullsum.casefile.CaseSchema;
import picocli.CommandLine;
import picocli.CommandLine.Help.Ansi;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Model.OptionSpec;
import picocli.CommandLine.Model.PositionalParamSpec;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.ParseResult;
import picocli.CommandLine.UnmatchedArgumentException;

/**
 * The program as a function of its arguments, its two output streams and the clock. Whatever
 * happens, {@link #run} returns an exit code; a fault of the program is one line on standard error.
 */
final class Program {
  private static final int USAGE_WIDTH = 100;

  /** Answered without the command-line library, for scripts that ask at every turn. */
  private static final List<String> VERSION = List.of("--version");

  private final Output out;
  private final Output err;
  private final Clock clock;
  private final CasePipeline pipeline;
  private final Terminal terminal;

  Program(
      OutputStream out, OutputStream err, Clock clock, CasePipeline pipeline, Terminal terminal) {
    this.out = new Output(out);
    this.err = new Output(err);
    this.clock = clock;
    this.pipeline = pipeline;
    this.terminal = terminal;
  }

  /** Carries out the command. */
  ExitCode run(List<String> arguments) {
    ExitCode code;
    try {
      code =
          arguments.equals(VERSION)
              ? version()
              : isPlainAudit(arguments)
                  ? audit(AuditRequest.usual(arguments.subList(1, arguments.size())))
                  : parse(commands(), arguments);
    } catch (Throwable fault) {
      err.line("hullsum: " + Faults.describe(fault));
      code = ExitCode.FAULT;
    }
    if (out.hasFailed()) {
      err.line("standard output can't be written");
      code = code.and(ExitCode.CANNOT_WRITE);
    }
    return code;
  }

  /**
   * Whether it is an audit of files and nothing else. The most frequent command is understood
   * without the command-line library, which takes as long to load as a small case to read.
   */
  private static boolean isPlainAudit(List<String> arguments) {
    return arguments.size() > 1
        && arguments.get(0).equals("audit")
        && arguments.stream().noneMatch(a -> a.isEmpty() || a.startsWith("-"));
  }

  private static CommandLine commands() {
    CommandSpec root = withHelp(CommandSpec.create().name("hullsum"));
    root.usageMessage()
        .description(
            "Checks whether what flows through closed surfaces balances with what is made and kept"
                + " inside.");
    root.addSubcommand("audit", withHelp(AuditOptionsReader.declare()));
    CommandSpec start = withHelp(CommandSpec.create());
    start
        .usageMessage()
        .description(
            "Prints a small, complete case to begin from, or where to read a duct's section.");
    start.addPositional(
        PositionalParamSpec.builder()
            .paramLabel("KIND")
            .arity("1")
            .required(true)
            .type(String.class)
            .description(StarterCase.kinds() + ".")
            .build());
    TraverseSheet.declare(start);
    root.addSubcommand("orient", orientCommand());
    root.addSubcommand("start", start);
    CommandSpec schema = withHelp(CommandSpec.create());
    schema.usageMessage().description("Prints the JSON Schema of the case format, for editors.");
    root.addSubcommand("schema", schema);
    return new CommandLine(root).setExpandAtFiles(false).setUsageHelpWidth(USAGE_WIDTH);
  }

  private static CommandSpec orientCommand() {
    CommandSpec orient = withHelp(CommandSpec.create());
    orient
        .usageMessage()
        .description(
            "Writes the case with the facing corrected of every patch that was found to face"
                + " inward, all else untouched: beside the original, as NAME-oriented.yaml. Of"
                + " meshes some of whose triangles face against the others it writes turned"
                + " copies, as NAME-oriented.obj.");
    orient.addPositional(
        PositionalParamSpec.builder()
            .paramLabel("CASE")
            .arity("1")
            .required(true)
            .type(String.class)
            .description("A case file, format hullsum-case/1.")
            .build());
    orient.addOption(
        OptionSpec.builder("--in-place")
            .arity("0")
            .type(boolean.class)
            .description("Replaces the original.")
            .build());
    return orient;
  }

  private static CommandSpec withHelp(CommandSpec spec) {
    spec.usageMessage().sortOptions(false);
    spec.addOption(
        OptionSpec.builder("-h", "--help")
            .usageHelp(true)
            .description("Prints this help.")
            .build());
    spec.addOption(
        OptionSpec.builder("--version")
            .versionHelp(true)
            .description("Prints the version.")
            .build());
    return spec;
  }

  private ExitCode parse(CommandLine root, List<String> arguments) {
    try {
      ParseResult parsed = root.parseArgs(arguments.toArray(new String[0]));
      return parsed.hasSubcommand()
          ? carryOut(parsed.subcommand())
          : helpOrVersion(parsed, root) ? ExitCode.FINE : wrongUse(root, "a command is missing");
    } catch (UnmatchedArgumentException e) {
      List<String> near = e.getSuggestions();
      String hint = near.isEmpty() ? "" : "; did you mean " + String.join(" or ", near) + "?";
      return wrongUse(e.getCommandLine(), e.getMessage() + hint);
    } catch (ParameterException e) {
      return wrongUse(e.getCommandLine(), e.getMessage());
    }
  }

  private ExitCode wrongUse(CommandLine command, String message) {
    String name = command.getCommandSpec().qualifiedName();
    err.line(name + ": " + message.replaceAll("\\p{Cntrl}+", " "));
    err.line("'" + name + " -h' shows what can be asked.");
    return ExitCode.WRONG_USE;
  }

  private boolean helpOrVersion(ParseResult parsed, CommandLine command) {
    if (parsed.isUsageHelpRequested()) {
      out.print(command.getUsageMessage(Ansi.OFF));
    } else if (parsed.isVersionHelpRequested()) {
      out.line(ProgramVersion.text());
    }
    return parsed.isUsageHelpRequested() || parsed.isVersionHelpRequested();
  }

  private ExitCode carryOut(ParseResult parsed) {
    CommandLine command = parsed.commandSpec().commandLine();
    if (helpOrVersion(parsed, command)) {
      return ExitCode.FINE;
    }
    return switch (command.getCommandName()) {
      case "audit" -> audit(AuditOptionsReader.read(command, parsed));
      case "orient" ->
          new OrientRun(
                  parsed.matchedPositionalValue(0, ""),
                  parsed.hasMatchedOption("--in-place"),
                  out,
                  err,
                  clock,
                  pipeline)
              .run();
      case "start" -> start(command, parsed);
      default -> schema();
    };
  }

  private ExitCode audit(AuditRequest request) {
    return new AuditRun(request, out, err, clock, pipeline, terminal).run();
  }

  private ExitCode start(CommandLine command, ParseResult parsed) {
    String kind = parsed.matchedPositionalValue(0, "");
    if (kind.equals(TraverseSheet.KIND)) {
      out.print(new TraverseSheet(command, parsed).text());
      return ExitCode.FINE;
    }
    TraverseSheet.refuse(command, parsed);
    StarterCase starter =
        StarterCase.of(kind)
            .orElseThrow(() -> new ParameterException(command, StarterCase.refusal(kind)));
    out.print(starter.text());
    return ExitCode.FINE;
  }

  private ExitCode version() {
    out.line(ProgramVersion.text());
    return ExitCode.FINE;
  }

  private ExitCode schema() {
    out.print(CaseSchema.text());
    return ExitCode.FINE;
  }
}
