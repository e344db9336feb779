package turnsheet.report.web;

import java.io.ByteArrayInputStream;
import java.util.List;
import org.verapdf.gf.foundry.VeraGreenfieldFoundryProvider;
import org.verapdf.pdfa.Foundries;
import org.verapdf.pdfa.PDFAParser;
import org.verapdf.pdfa.PDFAValidator;
import org.verapdf.pdfa.flavours.PDFAFlavour;
import org.verapdf.pdfa.results.TestAssertion;

/** Holds a PDF against a standard with veraPDF, a checker written apart from what makes it. */
final class PdfStandards {

  static {
    VeraGreenfieldFoundryProvider.initialise();
  }

  private PdfStandards() {}

  /** Everything the standard does not allow, each with its clause and place. */
  static List<String> breaches(byte[] pdf, PDFAFlavour standard) throws Exception {
    try (PDFAParser parser =
            Foundries.defaultInstance().createParser(new ByteArrayInputStream(pdf), standard);
        PDFAValidator validator = Foundries.defaultInstance().createValidator(standard, false)) {
      var result = validator.validate(parser);
      if (result.getTotalAssertions() == 0) {
        throw new IllegalStateException("nothing was checked");
      }
      return result.getTestAssertions().stream()
          .filter(found -> found.getStatus() == TestAssertion.Status.FAILED)
          .map(
              found ->
                  "clause %s, test %d: %s, at %s"
                      .formatted(
                          found.getRuleId().getClause(),
                          found.getRuleId().getTestNumber(),
                          found.getMessage(),
                          found.getLocation().getContext()))
          .toList();
    }
  }
}
