/**
 * Published instances: read from their files, or generated from their definitions.
 *
 * <p>{@link dev.couplet.bench.instances.InstanceReader} reads files; each kind is one class behind
 * it. {@link dev.couplet.bench.instances.Seeded} are instances published as a seed; {@link
 * dev.couplet.bench.instances.Torus} and {@link dev.couplet.bench.instances.Couplings} make the
 * lattices that speed is measured on. An {@link dev.couplet.bench.instances.Instance} is a form to
 * be minimised that knows how its energies read in the file's own sense and units, or a model.
 */
@CheckReturnValue
@NullMarked
package dev.couplet.bench.instances;

import dev.couplet.form.CheckReturnValue;
import org.jspecify.annotations.NullMarked;
