package turnsheet.shop.web;

import jakarta.validation.Valid;
import java.net.URI;
import java.util.UUID;
import org.springframework.http.ResponseEntity;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.PutMapping;
import org.springframework.web.bind.annotation.RequestBody;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.bind.annotation.RestController;
import turnsheet.shop.Media;
import turnsheet.shop.MediumId;
import turnsheet.shop.PageQuery;
import turnsheet.web.NotFoundException;

/** Reference media for programs. */
@RestController
@RequestMapping(MediaApi.PATH)
class MediaApi {

  static final String PATH = "/api/v1/media";

  private final Media media;
  private final Refusals refusals;

  MediaApi(Media media, Refusals refusals) {
    this.media = media;
    this.refusals = refusals;
  }

  @GetMapping
  PageDocument<MediumDocument> list(
      @RequestParam(defaultValue = "") String q,
      @RequestParam(defaultValue = "1") int page,
      @RequestParam(defaultValue = "50") int size) {
    return PageDocument.of(media.page(new PageQuery(q, page, size)), MediumDocument::of);
  }

  @GetMapping("/{id}")
  MediumDocument get(@PathVariable UUID id) {
    return media
        .find(new MediumId(id))
        .map(MediumDocument::of)
        .orElseThrow(() -> new NotFoundException("medium"));
  }

  @PostMapping
  ResponseEntity<MediumDocument> add(@Valid @RequestBody MediumDocument sent) {
    MediumDocument added =
        MediumDocument.of(refusals.orAnswer(() -> media.add(sent.medium(MediumId.next()))));
    return ResponseEntity.created(URI.create(PATH + "/" + added.id())).body(added);
  }

  @PutMapping("/{id}")
  MediumDocument change(@PathVariable UUID id, @Valid @RequestBody MediumDocument sent) {
    return refusals
        .orAnswer(() -> media.change(sent.medium(new MediumId(id))))
        .map(MediumDocument::of)
        .orElseThrow(() -> new NotFoundException("medium"));
  }
}
