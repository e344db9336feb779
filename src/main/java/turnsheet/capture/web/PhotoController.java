package turnsheet.capture.web;

import java.io.IOException;
import java.io.InputStream;
import java.security.Principal;
import java.util.UUID;
import org.springframework.core.io.InputStreamResource;
import org.springframework.core.io.Resource;
import org.springframework.http.CacheControl;
import org.springframework.http.MediaType;
import org.springframework.http.ResponseEntity;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.multipart.MultipartFile;
import turnsheet.capture.PlatePhotos;
import turnsheet.capture.PlatePhotos.PlatePhoto;
import turnsheet.capture.StoreException;
import turnsheet.capture.UploadTrouble;
import turnsheet.shop.VisitId;
import turnsheet.web.NotFoundException;
import turnsheet.web.RefusedRequestException;

/** The photograph of the type plate on a visit. */
@Controller
class PhotoController {

  private final PlatePhotos photos;

  PhotoController(PlatePhotos photos) {
    this.photos = photos;
  }

  @PostMapping("/visits/{visit}/photo")
  String put(
      @PathVariable UUID visit,
      @RequestParam(name = "photo") MultipartFile photo,
      Principal visitor)
      throws IOException {
    if (photo.isEmpty()) {
      throw new RefusedRequestException("noFile", "No file came with the form: choose one.");
    }
    try (InputStream in = photo.getInputStream()) {
      photos.put(new VisitId(visit), visitor.getName(), in);
    } catch (StoreException e) {
      throw UploadTrouble.refused(e);
    }
    return "redirect:/visits/" + visit;
  }

  /** Always what the service wrote itself, and always told to be a picture. */
  @GetMapping("/visits/{visit}/photo")
  ResponseEntity<Resource> picture(@PathVariable UUID visit) throws IOException {
    PlatePhoto photo = photo(visit);
    return ResponseEntity.ok()
        .contentType(MediaType.IMAGE_JPEG)
        .contentLength(photo.bytes().length())
        .cacheControl(CacheControl.noCache().cachePrivate())
        .eTag(photo.bytes().sha256())
        .header("X-Content-Type-Options", "nosniff")
        .body(new InputStreamResource(photos.open(photo).open()));
  }

  @GetMapping("/visits/{visit}/photo/remove")
  String askRemoval(@PathVariable UUID visit, Model model) {
    photo(visit);
    model.addAttribute("visit", visit);
    return "capture/photo-remove";
  }

  @PostMapping("/visits/{visit}/photo/remove")
  String remove(@PathVariable UUID visit) {
    photos.remove(new VisitId(visit));
    return "redirect:/visits/" + visit;
  }

  private PlatePhoto photo(UUID visit) {
    return photos.of(new VisitId(visit)).orElseThrow(() -> new NotFoundException("photograph"));
  }
}
