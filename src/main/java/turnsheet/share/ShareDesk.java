package turnsheet.share;

import java.time.Clock;
import org.springframework.beans.factory.annotation.Value;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Transactional;
import turnsheet.access.AuditTrail;
import turnsheet.access.CurrentUser;
import turnsheet.report.Issue;
import turnsheet.report.Report;
import turnsheet.report.Reports;
import turnsheet.web.NotFoundException;
import turnsheet.web.RefusedRequestException;

/** Makes and withdraws links in the name of who is signed in, and keeps a record of it. */
@Service
public class ShareDesk {

  /** Path below the public address at which a link's token stands. */
  public static final String PATH = "/s/";

  private final ShareLinks links;
  private final Reports reports;
  private final CurrentUser user;
  private final AuditTrail audit;
  private final Clock clock;
  private final String publicAddress;

  ShareDesk(
      ShareLinks links,
      Reports reports,
      CurrentUser user,
      AuditTrail audit,
      Clock clock,
      @Value("${turnsheet.public-address}") String publicAddress) {
    this.links = links;
    this.reports = reports;
    this.user = user;
    this.audit = audit;
    this.clock = clock;
    this.publicAddress = publicAddress.replaceAll("/+$", "");
  }

  /**
   * A link with the whole address that opens it, told once.
   *
   * @param address to be given to the customer
   */
  public record Given(ShareLink link, String address) {}

  /**
   * Makes a link to a report.
   *
   * @throws RefusedRequestException if the number of days is out of bounds
   */
  @Transactional
  public Given make(long number, boolean showsHistory, int days) {
    if (days < ShareLinks.SHORTEST_DAYS || days > ShareLinks.LONGEST_DAYS) {
      throw new RefusedRequestException(
          "linkDays",
          "A link can last from "
              + ShareLinks.SHORTEST_DAYS
              + " to "
              + ShareLinks.LONGEST_DAYS
              + " days: choose a number between them.");
    }
    Report report = reports.find(number).orElseThrow(() -> new NotFoundException("report"));
    ShareLinks.Made made =
        links.make(report.visitId(), number, showsHistory, user.signInName(), days);
    audit.record("share.audit.made", Issue.printed(number));
    return new Given(made.link(), publicAddress + PATH + made.token());
  }

  /** Ends a link now; whoever has it sees nothing more. */
  @Transactional
  public void withdraw(ShareLinkId id) {
    ShareLink link = links.find(id).orElseThrow(() -> new NotFoundException("link"));
    links.withdraw(id);
    audit.record("share.audit.withdrawn", Issue.printed(link.reportNumber()));
  }

  public boolean isOpen(ShareLink link) {
    return link.opensAt(clock.instant());
  }
}
