/** Sparse hosts: fitting a dense form onto them, and reading it back. */
module dev.couplet.embed {
  requires static org.jspecify;
  requires transitive dev.couplet.api;
  requires transitive org.jgrapht.core;

  exports dev.couplet.bond;
  exports dev.couplet.embed;
  exports dev.couplet.embed.best;
  exports dev.couplet.embed.path;
  exports dev.couplet.embed.template;
  exports dev.couplet.host;
}
