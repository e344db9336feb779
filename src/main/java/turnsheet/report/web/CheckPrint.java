package turnsheet.report.web;

import org.springframework.beans.factory.annotation.Value;
import org.springframework.stereotype.Component;
import turnsheet.report.Report;
import turnsheet.web.QrDrawing;
import turnsheet.web.Wording;

/** How a printed report tells that it can be checked, and where. */
@Component
class CheckPrint {

  private final String publicAddress;

  CheckPrint(@Value("${turnsheet.public-address}") String publicAddress) {
    this.publicAddress = publicAddress.replaceAll("/+$", "");
  }

  SheetPage.Check of(Report report, Wording words) {
    String address = publicAddress + CheckController.PATH;
    QrDrawing code = QrDrawing.of(address + "?code=" + report.checkCode());
    return new SheetPage.Check(
        words.text("report.check.sentence", report.checkCode(), address),
        "<svg xmlns=\"http://www.w3.org/2000/svg\" class=\"check-code\" role=\"img\" width=\"96\""
            + " height=\"96\" viewBox=\"0 0 %d %d\"><title>%s</title><path d=\"%s\"/></svg>"
                .formatted(
                    code.modules(),
                    code.modules(),
                    words.text("report.check.picture"),
                    code.path()));
  }
}
