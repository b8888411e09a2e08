/**
 * Hosts: sparse graphs that carry a form which does not fit them directly.
 *
 * <p>A {@link dev.couplet.host.Host} is a {@link dev.couplet.host.CompactGraph} with a name, places
 * to draw its vertices, and perhaps {@link dev.couplet.host.Faults}. Regular hosts are {@link
 * dev.couplet.host.Lattice}s: {@link dev.couplet.host.Cells}, {@link dev.couplet.host.King}, {@link
 * dev.couplet.host.Square}, {@link dev.couplet.host.Cubic}; another lattice is another class that
 * implements the interface. Any other graph comes from JGraphT or from text by {@link
 * dev.couplet.host.EdgeList}.
 *
 * <p>Vertices are numbered 0 to n - 1, and keep their numbers when some are missing. All types are
 * immutable and safe to share between threads, builders excepted.
 */
@NullMarked
package dev.couplet.host;

import org.jspecify.annotations.NullMarked;
