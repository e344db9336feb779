package turnsheet.report.web;

import com.openhtmltopdf.outputdevice.helper.BaseRendererBuilder;
import com.openhtmltopdf.pdfboxout.PdfRendererBuilder;
import com.openhtmltopdf.svgsupport.BatikSVGDrawer;
import java.awt.color.ColorSpace;
import java.awt.color.ICC_Profile;
import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Locale;
import java.util.Map;
import java.util.Objects;
import javax.xml.XMLConstants;
import javax.xml.parsers.DocumentBuilderFactory;
import javax.xml.parsers.ParserConfigurationException;
import org.springframework.stereotype.Component;
import org.thymeleaf.ITemplateEngine;
import org.thymeleaf.context.Context;
import org.w3c.dom.Document;
import org.w3c.dom.Element;
import org.w3c.dom.NodeList;
import org.xml.sax.SAXException;
import turnsheet.report.Report;
import turnsheet.web.PlainText;

/** Writes sheets out: as the article that pages show, and as a PDF. Both come from one template. */
@Component
public class SheetPrinting {

  private static final String FONTS = "/net/sf/jasperreports/fonts/dejavu/";

  private final ITemplateEngine templates;
  private final SheetPages pages;

  SheetPrinting(ITemplateEngine templates, SheetPages pages) {
    this.templates = templates;
    this.pages = pages;
  }

  /** An issued report as an article to be set into a page, in the language of the report. */
  public String article(Report report) {
    return written("report/article", pages.of(report));
  }

  /** An issued report as PDF/A-2a with tags, fonts embedded. */
  public byte[] pdf(Report report) {
    SheetPage page = pages.of(report);
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    try {
      new PdfRendererBuilder()
          .usePdfAConformance(PdfRendererBuilder.PdfAConformance.PDFA_2_A)
          .usePdfUaAccessibility(true)
          .useColorProfile(ICC_Profile.getInstance(ColorSpace.CS_sRGB).getData())
          .useSVGDrawer(new BatikSVGDrawer())
          .useFont(() -> font("DejaVuSansCondensed.ttf"), "sheet", 400, NORMAL, true)
          .useFont(() -> font("DejaVuSansCondensed-Bold.ttf"), "sheet", 700, NORMAL, true)
          .withProducer("Turnsheet")
          .withW3cDocument(document(written("report/pdf", page)), "")
          .toStream(out)
          .run();
    } catch (IOException e) {
      throw new UncheckedIOException(e); // nothing but memory is written to
    }
    return out.toByteArray();
  }

  private static final BaseRendererBuilder.FontStyle NORMAL = BaseRendererBuilder.FontStyle.NORMAL;

  private static InputStream font(String file) {
    return Objects.requireNonNull(SheetPrinting.class.getResourceAsStream(FONTS + file), file);
  }

  private String written(String template, SheetPage page) {
    Locale locale = Locale.forLanguageTag(page.language());
    return templates.process(template, new Context(locale, Map.of("sheet", page)));
  }

  /**
   * The templates are well-formed XML; what an old entry or a file brought into them may not be.
   */
  private static Document document(String html) {
    String xml = PlainText.showable(html);
    try {
      DocumentBuilderFactory factory = DocumentBuilderFactory.newInstance();
      factory.setFeature(XMLConstants.FEATURE_SECURE_PROCESSING, true);
      factory.setFeature("http://apache.org/xml/features/disallow-doctype-decl", true);
      factory.setNamespaceAware(true);
      Document document =
          factory
              .newDocumentBuilder()
              .parse(new ByteArrayInputStream(xml.getBytes(StandardCharsets.UTF_8)));
      nameDrawings(document);
      return document;
    } catch (ParserConfigurationException | SAXException | IOException e) {
      throw new IllegalStateException("the sheet is not well-formed", e);
    }
  }

  /** The library takes what a drawing shows from an attribute that HTML does not know there. */
  private static void nameDrawings(Document document) {
    NodeList drawings = document.getElementsByTagNameNS("*", "svg");
    for (int i = 0; i < drawings.getLength(); i++) {
      Element drawing = (Element) drawings.item(i);
      NodeList titles = drawing.getElementsByTagNameNS("*", "title");
      if (titles.getLength() > 0) {
        drawing.setAttribute("alt", titles.item(0).getTextContent());
      }
    }
  }
}
