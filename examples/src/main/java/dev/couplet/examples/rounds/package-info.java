/**
 * A mobile library decides which van serves which village: the library from end to end.
 *
 * <p>The scenario and its data are invented. Read in the order of the work: {@code Village}, {@code
 * Van}, {@code Wish} and {@code Pair} are the business; {@code RoundsReader} reads them from a
 * folder of CSV files and {@code RoundsCheck} refuses what cannot work; {@code RoundsModel} states
 * the problem; {@link dev.couplet.examples.rounds.Rounds} lowers, audits and solves it. Each page
 * of the report is one class ({@code ModelPage}, {@code LoweringPage}, {@code AuditPage}, {@code
 * PlanPage}, {@code AnswerPage}), and {@code RoundsMap} draws the plan.
 */
@NullMarked
package dev.couplet.examples.rounds;

import org.jspecify.annotations.NullMarked;
