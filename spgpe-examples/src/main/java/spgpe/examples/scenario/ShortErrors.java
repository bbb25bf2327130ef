package spgpe.examples.scenario;

import picocli.CommandLine;

/** How the commands report errors: one line, and an exit code that tells whose fault it was. */
public final class ShortErrors {
  private ShortErrors() {}

  /**
   * Sets the error handling of a command: 2 for a wrong value, 1 for anything else.
   *
   * @param line the command, changed
   * @return the same
   */
  public static CommandLine on(CommandLine line) {
    String name = line.getCommandName() + ": ";
    line.setParameterExceptionHandler(
        (wrong, arguments) -> {
          wrong.getCommandLine().getErr().println(name + wrong.getMessage() + " (see --help)");
          return 2;
        });
    line.setExecutionExceptionHandler(
        (failure, command, parsed) -> {
          command.getErr().println(name + failure.getMessage());
          return failure instanceof IllegalArgumentException ? 2 : 1;
        });
    return line;
  }
}
