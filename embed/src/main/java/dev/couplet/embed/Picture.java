package dev.couplet.embed;

import dev.couplet.host.Host;
import java.io.IOException;
import java.util.List;

/**
 * A drawing of a host, and of the branch sets on it, as an SVG text.
 *
 * <p>Vertices stand where the host places them. Each branch set has a colour of a palette that
 * colour-blind people can tell apart, chosen so that sets side by side differ where that is
 * possible, and each of its vertices bears the number of the guest vertex; whoever points at one
 * reads its place on the host. Title, figures and a legend are part of the picture. Its size grows
 * with the host up to 3,000 pixels a side. Immutable.
 */
public final class Picture {
  private final Embedding embedding;
  private final String title;

  private Picture(Embedding embedding, String title) {
    this.embedding = embedding;
    this.title = title;
  }

  /** A picture of a host with nothing on it. */
  public static Picture of(Host host) {
    Embedding nothing = Embedding.of(Guests.complete(0), host, List.of());
    return new Picture(nothing, host.name());
  }

  /** A picture of an embedding. */
  public static Picture of(Embedding embedding) {
    return new Picture(embedding, embedding.guest().name() + " on " + embedding.host().name());
  }

  /** This picture under another title. */
  public Picture title(String newTitle) {
    return new Picture(embedding, newTitle);
  }

  /**
   * Writes the picture as an SVG document; linear in the size of the host.
   *
   * @throws IOException if {@code out} does
   */
  public void writeSvg(Appendable out) throws IOException {
    out.append(toSvg());
  }

  /** The picture as an SVG document. */
  public String toSvg() {
    return new PictureDrawing(embedding, title).svg();
  }
}
