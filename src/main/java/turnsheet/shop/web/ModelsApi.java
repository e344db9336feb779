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
import turnsheet.shop.MachineModels;
import turnsheet.shop.ModelId;
import turnsheet.shop.PageQuery;
import turnsheet.web.NotFoundException;

/** Machine models for programs: each with all its settings, parts and limits at once. */
@RestController
@RequestMapping(ModelsApi.PATH)
class ModelsApi {

  static final String PATH = "/api/v1/models";

  private final MachineModels models;
  private final ModelDocuments documents;
  private final Refusals refusals;

  ModelsApi(MachineModels models, ModelDocuments documents, Refusals refusals) {
    this.models = models;
    this.documents = documents;
    this.refusals = refusals;
  }

  @GetMapping
  PageDocument<ModelDocument> list(
      @RequestParam(defaultValue = "") String q,
      @RequestParam(defaultValue = "1") int page,
      @RequestParam(defaultValue = "50") int size) {
    return PageDocument.of(models.wholePage(new PageQuery(q, page, size)), documents::write);
  }

  @GetMapping("/{id}")
  ModelDocument get(@PathVariable UUID id) {
    return models
        .find(new ModelId(id))
        .map(documents::write)
        .orElseThrow(() -> new NotFoundException("machine model"));
  }

  @PostMapping
  ResponseEntity<ModelDocument> add(@Valid @RequestBody ModelDocument sent) {
    ModelDocument added =
        documents.write(refusals.orAnswer(() -> models.add(documents.read(sent))));
    return ResponseEntity.created(URI.create(PATH + "/" + added.id())).body(added);
  }

  @PutMapping("/{id}")
  ModelDocument change(@PathVariable UUID id, @Valid @RequestBody ModelDocument sent) {
    return refusals
        .orAnswer(() -> models.change(new ModelId(id), old -> documents.read(sent, old)))
        .map(documents::write)
        .orElseThrow(() -> new NotFoundException("machine model"));
  }
}
