package turnsheet.report.web;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayOutputStream;
import org.apache.pdfbox.Loader;
import org.apache.pdfbox.cos.COSName;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.rendering.PDFRenderer;
import org.apache.pdfbox.text.PDFTextStripper;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.context.MessageSource;
import org.thymeleaf.ITemplateEngine;
import org.verapdf.pdfa.flavours.PDFAFlavour;
import turnsheet.report.Issue;
import turnsheet.report.Report;
import turnsheet.report.SampleReport;
import turnsheet.testing.QrReader;
import turnsheet.testing.ServiceTest;
import turnsheet.web.Times;

@ServiceTest
class SheetPrintingTest {

  @Autowired ITemplateEngine templates;
  @Autowired MessageSource messages;
  @Autowired Times times;

  private SheetPrinting printing;

  @BeforeEach
  void anAddressOfItsOwn() {
    printing =
        new SheetPrinting(
            templates, new SheetPages(messages, times, new CheckPrint("https://bench.example")));
  }

  @ParameterizedTest
  @ValueSource(strings = {"en", "de"})
  void keepsTheStandardsThatItClaims(String language) throws Exception {
    byte[] pdf = pdf(language);
    assertThat(PdfStandards.breaches(pdf, PDFAFlavour.PDFA_2_A)).isEmpty();
    assertThat(PdfStandards.breaches(pdf, PDFAFlavour.PDFUA_1)).isEmpty();
  }

  @Test
  void theCheckerMissesWhatIsTakenAway() throws Exception {
    ByteArrayOutputStream without = new ByteArrayOutputStream();
    try (PDDocument document = Loader.loadPDF(pdf("en"))) {
      document.getDocumentCatalog().getCOSObject().removeItem(COSName.STRUCT_TREE_ROOT);
      document.getDocumentCatalog().getCOSObject().removeItem(COSName.LANG);
      document.save(without);
    }
    // ISO 19005-2, 6.7: logical structure; ISO 14289-1, 7.1 and 7.2: tags and language
    assertThat(PdfStandards.breaches(without.toByteArray(), PDFAFlavour.PDFA_2_A))
        .anyMatch(breach -> breach.startsWith("clause 6.7"));
    assertThat(PdfStandards.breaches(without.toByteArray(), PDFAFlavour.PDFUA_1))
        .anyMatch(breach -> breach.startsWith("clause 7.1"));
  }

  @Test
  void looksAsApproved() throws Exception {
    try (PDDocument document = Loader.loadPDF(pdf("en"))) {
      assertThat(ApprovedPages.differences(document, "report")).isEmpty();
    }
  }

  @Test
  void theCodeOnTheLastPageLeadsToTheCheck() throws Exception {
    try (PDDocument document = Loader.loadPDF(pdf("en"))) {
      var lastPage =
          new PDFRenderer(document).renderImageWithDPI(document.getNumberOfPages() - 1, 150);
      assertThat(QrReader.read(lastPage))
          .isEqualTo("https://bench.example/check?code=0a1b2-c3d4e-5f607-18293");
    }
  }

  @Test
  void printsWhatWasEnteredWithAStrayControlCharacter() throws Exception {
    Report sample = SampleReport.in("en");
    Issue issue = sample.content().issue();
    Issue odd =
        new Issue(
            issue.number(),
            issue.issuedAt(),
            issue.language(),
            issue.paper(),
            issue.measuredBy(),
            issue.releasedBy(),
            issue.conditions(),
            "belt\u0001slack",
            issue.revises(),
            issue.reason());
    byte[] pdf =
        printing.pdf(
            new Report(
                sample.visitId(),
                new Report.Content(odd, sample.content().sheet()),
                sample.contentJson(),
                sample.contentSha256(),
                sample.checkCode(),
                null));
    try (PDDocument document = Loader.loadPDF(pdf)) {
      assertThat(new PDFTextStripper().getText(document)).contains("beltslack");
    }
  }

  private byte[] pdf(String language) {
    return printing.pdf(SampleReport.in(language));
  }
}
