package dev.couplet.embed;

import dev.couplet.sampling.End;
import java.util.Optional;
import java.util.OptionalInt;

/** What an embedder answers: it fits, it cannot fit, or nothing was found. */
public sealed interface Fit {
  /** The embedding, if there is one. */
  default Optional<Embedding> embedding() {
    return Optional.empty();
  }

  /** Whether there is an embedding. */
  default boolean fits() {
    return embedding().isPresent();
  }

  /**
   * The embedding.
   *
   * @throws IllegalStateException if there is none, saying why
   */
  Embedding orThrow();

  /**
   * It fits.
   *
   * @param found the embedding
   */
  record Fits(Embedding found) implements Fit {
    @Override
    public Optional<Embedding> embedding() {
      return Optional.of(found);
    }

    @Override
    public Embedding orThrow() {
      return found;
    }
  }

  /**
   * It is proved that no embedding exists.
   *
   * @param because the proof in a sentence
   */
  record Impossible(String because) implements Fit {
    @Override
    public Embedding orThrow() {
      throw new IllegalStateException("no embedding exists: " + because);
    }
  }

  /**
   * No embedding was found; there may be one.
   *
   * @param end why the search ended
   * @param overlap how near it came: in the best attempt, how many uses of host vertices were one
   *     too many (a vertex in three sets counts 2); empty if the method cannot tell
   */
  record NotFound(End end, OptionalInt overlap) implements Fit {
    @Override
    public Embedding orThrow() {
      throw new IllegalStateException(
          "no embedding was found, the search ended with "
              + end
              + (overlap.isPresent() ? " and an overlap of " + overlap.getAsInt() : "")
              + "; allow more effort, another seed, or a larger host");
    }
  }
}
