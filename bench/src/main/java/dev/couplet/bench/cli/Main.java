package dev.couplet.bench.cli;

import java.io.IOException;
import java.io.PrintWriter;
import java.nio.file.AccessDeniedException;
import java.nio.file.NoSuchFileException;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.ParseResult;
import picocli.CommandLine.Spec;

/**
 * The program {@code couplet-bench.jar}.
 *
 * <p>Rows go to standard output, everything else to standard error. Exit status: 0 done, 1 not
 * reached, 2 bad use or bad input, told in one line.
 */
@Command(
    name = "couplet-bench",
    description = {
      "Solves published instances and measures the library.",
      "",
      "Rows of a table, separated by tabs, go to standard output; everything else goes to standard"
          + " error."
    },
    subcommands = {
      SolveCommand.class,
      RateCommand.class,
      OverrunCommand.class,
      FitCommand.class,
      LowerCommand.class,
      CommandLine.HelpCommand.class
    },
    mixinStandardHelpOptions = true,
    version = "couplet-bench 0.1.0-SNAPSHOT",
    synopsisSubcommandLabel = "VERB",
    commandListHeading = "%nVerbs:%n",
    optionListHeading = "%nOptions:%n",
    exitCodeListHeading = "%nExit status:%n",
    exitCodeList = {
      "0:done",
      "1:done, but the target was not reached",
      "2:bad use or bad input",
      "3:a defect of this program"
    })
public final class Main implements Runnable {
  private static final int BAD_INPUT = 2;
  private static final int DEFECT = 3;

  @Spec private CommandSpec spec = CommandSpec.create();

  private Main() {}

  /** Runs one verb and ends the virtual machine with its exit status. */
  public static void main(String[] arguments) {
    System.exit(execute(commandLine(), arguments));
  }

  /** Runs one verb and returns its exit status. */
  static int execute(CommandLine line, String... arguments) {
    try {
      return line.execute(arguments);
    } catch (OutOfMemoryError full) {
      line.getErr().println("there is too little memory for this; give java more, as in -Xmx8g");
      return BAD_INPUT;
    }
  }

  /** The parser of all verbs, ready to execute. */
  static CommandLine commandLine() {
    CommandLine line = new CommandLine(new Main());
    line.setParameterExceptionHandler((fault, arguments) -> badUse(fault));
    line.setExecutionExceptionHandler(Main::failed);
    line.setUsageHelpWidth(100);
    line.setUsageHelpAutoWidth(false);
    return line;
  }

  /** Without a verb there is nothing to do. */
  @Override
  public void run() {
    throw new ParameterException(spec.commandLine(), "no verb was given");
  }

  private static int badUse(ParameterException fault) {
    CommandLine line = fault.getCommandLine();
    String mend = "; see " + line.getCommandSpec().qualifiedName() + " --help";
    line.getErr().println(oneLine(fault) + mend);
    return BAD_INPUT;
  }

  private static int failed(Exception fault, CommandLine line, ParseResult parsed) {
    PrintWriter err = line.getErr();
    if (fault instanceof NoSuchFileException missing) {
      err.println(missing.getFile() + ": there is no such file");
    } else if (fault instanceof AccessDeniedException closed) {
      err.println(closed.getFile() + ": the file may not be read");
    } else if (fault instanceof IOException || fault instanceof IllegalArgumentException) {
      err.println(oneLine(fault));
    } else {
      fault.printStackTrace(err);
      return DEFECT;
    }
    return BAD_INPUT;
  }

  private static String oneLine(Exception fault) {
    return String.valueOf(fault.getMessage()).replaceAll("\\s*\\R\\s*", " ");
  }
}
