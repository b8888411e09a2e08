package dev.couplet.bench.architecture.bad.form;

import picocli.CommandLine;

/** Uses a library where there must be none. */
class Dependent {
  CommandLine line = new CommandLine(this);
}
