package dev.couplet.bench.architecture.bad.spare;

/** In no room of the design. */
class Homeless {}
