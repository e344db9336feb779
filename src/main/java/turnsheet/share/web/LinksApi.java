package turnsheet.share.web;

import java.time.Instant;
import java.util.List;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.http.HttpStatus;
import org.springframework.web.bind.annotation.DeleteMapping;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.bind.annotation.ResponseStatus;
import org.springframework.web.bind.annotation.RestController;
import turnsheet.share.ShareDesk;
import turnsheet.share.ShareLink;
import turnsheet.share.ShareLinkId;
import turnsheet.share.ShareLinks;

/** Share links for programs. */
@RestController
class LinksApi {

  private final ShareDesk desk;
  private final ShareLinks links;

  LinksApi(ShareDesk desk, ShareLinks links) {
    this.desk = desk;
    this.links = links;
  }

  /**
   * A link.
   *
   * @param address only in the answer that made it; null ever after
   */
  record LinkDocument(
      UUID id,
      long reportNumber,
      boolean showsHistory,
      @Nullable String address,
      Instant createdAt,
      String createdBy,
      Instant expiresAt,
      @Nullable Instant withdrawnAt,
      int views,
      @Nullable Instant lastViewAt) {

    static LinkDocument of(ShareLink link, @Nullable String address) {
      return new LinkDocument(
          link.id().value(),
          link.reportNumber(),
          link.showsHistory(),
          address,
          link.createdAt(),
          link.createdBy(),
          link.expiresAt(),
          link.withdrawnAt(),
          link.views(),
          link.lastViewAt());
    }
  }

  @GetMapping("/api/v1/reports/{number}/links")
  List<LinkDocument> list(@PathVariable long number) {
    return links.ofReport(number).stream().map(link -> LinkDocument.of(link, null)).toList();
  }

  @PostMapping("/api/v1/reports/{number}/links")
  @ResponseStatus(HttpStatus.CREATED)
  LinkDocument make(
      @PathVariable long number,
      @RequestParam(defaultValue = "false") boolean history,
      @RequestParam(defaultValue = "" + ShareLinks.USUAL_DAYS) int days) {
    ShareDesk.Given given = desk.make(number, history, days);
    return LinkDocument.of(given.link(), given.address());
  }

  @DeleteMapping("/api/v1/links/{id}")
  @ResponseStatus(HttpStatus.NO_CONTENT)
  void withdraw(@PathVariable UUID id) {
    desk.withdraw(new ShareLinkId(id));
  }
}
