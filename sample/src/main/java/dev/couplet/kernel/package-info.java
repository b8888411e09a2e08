/**
 * Arithmetic on primitive arrays: the loops in which samplers spend their time. Not for users: the
 * package is public only so that its neighbours can reach it, and it may change in any release.
 *
 * <p>{@link dev.couplet.kernel.Adjacency} lays a form out by rows, {@link
 * dev.couplet.kernel.LocalFields} holds one state with the energy change of every flip, {@link
 * dev.couplet.kernel.Metropolis} (in the blocks of a {@link dev.couplet.kernel.SweepOrder}, if the
 * form is sparse) and {@link dev.couplet.kernel.Descent} move it, {@link
 * dev.couplet.kernel.ClusterMoves} two of them at once. {@link dev.couplet.kernel.Moves} finds the
 * best of all flips in one pass, {@link dev.couplet.kernel.ReplicaSweeps} moves 64 states at once.
 * {@link dev.couplet.kernel.DrawLoop} runs the draws of any sampler in order, on the threads of a
 * run, with its target, deadline and stop; {@link dev.couplet.kernel.Pace} is what a kernel asks
 * whether to go on, and {@link dev.couplet.kernel.Streams} gives each draw random numbers of its
 * own.
 */
@CheckReturnValue
@NullMarked
package dev.couplet.kernel;

import dev.couplet.form.CheckReturnValue;
import org.jspecify.annotations.NullMarked;
