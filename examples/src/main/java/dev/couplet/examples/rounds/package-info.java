/**
 * A mobile library decides which van serves which village, and in what order: the library from end
 * to end.
 *
 * <p>The scenario and its data are invented. Read in the order of the work: {@code Village}, {@code
 * Van}, {@code Wish} and {@code Pair} are the business; {@code RoundsReader} reads them from a
 * folder of CSV files and {@code RoundsCheck} refuses what cannot work; {@code RoundsModel} states
 * the problem, {@code RoundsWeights} says how heavy its rules weigh; {@link
 * dev.couplet.examples.rounds.Rounds} lowers, audits and solves it. Each page of the report is one
 * class ({@code ModelPage}, {@code LoweringPage}, {@code AuditPage}, {@code DrawsPage}, {@code
 * PlanPage}, {@code AnswerPage}, {@code OrderPage}). Then {@code OrderRun} puts the villages of
 * each van in order: stage by stage, with a {@code VisitOrder} for each van, and jointly, by {@code
 * JointRun} of a {@code JointModel} that decides van and order at once. {@code RoundsMap} draws the
 * better rounds. A last part, {@code HostRun} with {@code HostPage}, carries a small copy of the
 * problem onto a sparse host and back.
 */
@NullMarked
package dev.couplet.examples.rounds;

import org.jspecify.annotations.NullMarked;
