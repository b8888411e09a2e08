package dev.couplet.embed;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.embed.template.TemplateEmbedder;
import dev.couplet.host.CompactGraph;
import dev.couplet.host.Faults;
import dev.couplet.host.Host;
import dev.couplet.sampling.Effort;
import java.io.IOException;
import java.io.StringReader;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import javax.xml.parsers.DocumentBuilderFactory;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.w3c.dom.Document;
import org.w3c.dom.Element;
import org.w3c.dom.NodeList;
import org.xml.sax.InputSource;

class PictureTest {
  private static final Embedding CLIQUE = clique(40, Host.cells(4, 10, 10));

  @Test
  void everyVertexIsDrawnAndExplained() throws Exception {
    Document picture = parse(Picture.of(CLIQUE));
    Map<String, Integer> kinds = kinds(picture);
    assertEquals(Map.of("free", 360, "guest vertex", 440), kinds);
    String text = picture.getDocumentElement().getTextContent();
    assertTrue(text.contains("guest vertex 39: upright 3 of cell (9, 9)"));
    assertTrue(text.contains("longest 11, mean 11.00"));
  }

  @Test
  void faultsAreMarked() throws Exception {
    Host square = Host.square(3, 3);
    Host broken = square.without(Faults.vertices(4));
    assertEquals(Map.of("free", 8, "missing", 1), kinds(parse(Picture.of(broken))));
    assertTrue(Picture.of(broken).toSvg().contains(">missing vertex<"));
    assertTrue(!Picture.of(square).toSvg().contains(">missing vertex<"));
  }

  private static Map<String, Integer> kinds(Document picture) {
    Map<String, Integer> kinds = new TreeMap<>();
    NodeList groups = picture.getElementsByTagName("g");
    for (int k = 0; k < groups.getLength(); k++) {
      String words = child((Element) groups.item(k), "title").getTextContent();
      kinds.merge(words.replaceAll("( [0-9]+)?: .*", ""), 1, Integer::sum);
    }
    return kinds;
  }

  /** Host vertices with their guest's number stand where the host places them, each on its own. */
  @Test
  void numbersStandOnTheirVertices() throws Exception {
    Document picture = parse(Picture.of(CLIQUE));
    NodeList groups = picture.getElementsByTagName("g");
    List<String> places = new ArrayList<>();
    for (int v = 0; v < groups.getLength(); v++) {
      Element circle = child((Element) groups.item(v), "circle");
      places.add(circle.getAttribute("cx") + " " + circle.getAttribute("cy"));
      if (CLIQUE.owner(v).isPresent()) {
        Element number = child((Element) groups.item(v), "text");
        assertEquals(circle.getAttribute("cx"), number.getAttribute("x"));
        assertEquals(Integer.toString(CLIQUE.owner(v).getAsInt()), number.getTextContent());
      }
    }
    assertEquals(800, places.stream().distinct().count());
  }

  private static Element child(Element element, String tag) {
    return (Element) element.getElementsByTagName(tag).item(0);
  }

  @Test
  void titlesMayHoldAnyText() throws Exception {
    Picture picture = Picture.of(Host.king(2, 2)).title("a < b & \"c\" > d");
    NodeList titles = parse(picture).getElementsByTagName("title");
    assertEquals("a < b & \"c\" > d", titles.item(0).getTextContent());
  }

  @Test
  void setsSideBySideDifferInColour() {
    Embedding path = clique(3, Host.king(2, 2));
    Palette palette = new Palette(path);
    assertNotEquals(palette.colour(0), palette.colour(1));
    assertNotEquals(palette.colour(1), palette.colour(2));
    assertNotEquals(palette.colour(0), palette.colour(2));
  }

  @ParameterizedTest
  @CsvSource({"0", "1", "2", "2500"})
  void anyHostCanBeDrawn(int vertices) throws Exception {
    Host host = Host.of("ring", ring(vertices));
    Element svg = parse(Picture.of(host)).getDocumentElement();
    double width = Double.parseDouble(svg.getAttribute("width"));
    double height = Double.parseDouble(svg.getAttribute("height"));
    assertTrue(width > 0 && width < 3400 && height > 0 && height < 3400, width + " x " + height);
  }

  private static CompactGraph ring(int vertices) {
    return vertices < 3 ? CompactGraph.builder(vertices).build() : Guests.cycle(vertices).graph();
  }

  @Test
  void placesThatCoincideAreDrawnAllTheSame() throws Exception {
    Host host = Host.square(2, 2).places(new double[4], new double[] {0, 0, 0, 1e-9});
    assertEquals(4, parse(Picture.of(host)).getElementsByTagName("g").getLength());
  }

  @Test
  void writesWhatItTells() throws IOException {
    StringBuilder written = new StringBuilder();
    Picture.of(CLIQUE).writeSvg(written);
    assertEquals(Picture.of(CLIQUE).toSvg(), written.toString());
  }

  @ParameterizedTest
  @CsvSource({"0,0", "1,1", "-0.04,0", "0.05,0.1", "-1.25,-1.2", "1234.56,1234.6", "-7,-7"})
  void numbersHaveOneDecimalAtMost(double value, String text) {
    assertEquals(text, Svg.number(value));
  }

  private static Embedding clique(int vertices, Host host) {
    return TemplateEmbedder.standard()
        .embed(Guests.complete(vertices), host, Effort.draws(1))
        .orThrow();
  }

  private static Document parse(Picture picture) throws Exception {
    return DocumentBuilderFactory.newInstance()
        .newDocumentBuilder()
        .parse(new InputSource(new StringReader(picture.toSvg())));
  }
}
