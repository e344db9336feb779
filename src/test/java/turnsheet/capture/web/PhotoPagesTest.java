package turnsheet.capture.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.csrf;

import java.awt.image.BufferedImage;
import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.util.UUID;
import javax.imageio.ImageIO;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.mock.web.MockMultipartFile;
import org.springframework.security.test.context.support.WithAnonymousUser;
import org.springframework.test.web.servlet.assertj.MockMvcTester;
import org.springframework.test.web.servlet.assertj.MvcTestResult;
import turnsheet.shop.Customers;
import turnsheet.shop.MachineModel;
import turnsheet.shop.MachineModels;
import turnsheet.shop.UnitId;
import turnsheet.shop.Units;
import turnsheet.shop.Visit;
import turnsheet.shop.Visits;
import turnsheet.testing.AsTechnician;
import turnsheet.testing.ServiceTest;

@ServiceTest
@AsTechnician
class PhotoPagesTest {

  @Autowired private MockMvcTester mvc;
  @Autowired private MachineModels models;
  @Autowired private Customers customers;
  @Autowired private Units units;
  @Autowired private Visits visits;
  private UnitId unit = UnitId.next();
  private String visit = "";

  @BeforeEach
  void openAVisit() {
    String name = UUID.randomUUID().toString();
    MachineModel model = models.add(MachineModel.named("Plated deck " + name, null, ""));
    unit = units.add(model.id(), customers.add("Owner of " + name, "").id(), name, "").id();
    Visit opened = visits.open(unit, "");
    visit = "/visits/" + opened.id();
  }

  @Test
  void aPhotographIsKeptShownAndTakenAwayAgain() throws Exception {
    assertThat(mvc.get().uri(visit + "/photo")).hasStatus(404);
    assertThat(page(visit)).contains("Add a photograph").doesNotContain("<img class=\"plate\"");
    assertThat(send(picture("png"))).hasStatus(302);

    MvcTestResult picture = mvc.get().uri(visit + "/photo").exchange();
    assertThat(picture)
        .hasStatusOk()
        .hasHeader("Content-Type", "image/jpeg")
        .hasHeader("X-Content-Type-Options", "nosniff");
    byte[] bytes = picture.getResponse().getContentAsByteArray();
    assertThat(ImageIO.read(new ByteArrayInputStream(bytes)).getWidth()).isEqualTo(40);
    assertThat(page(visit)).contains("<img class=\"plate\"", visit + "/photo");
    assertThat(page("/units/" + unit)).contains(visit + "/photo");

    assertThat(page(visit + "/photo/remove")).contains("cannot be undone");
    assertThat(mvc.post().uri(visit + "/photo/remove").with(csrf())).hasStatus(302);
    assertThat(mvc.get().uri(visit + "/photo")).hasStatus(404);
  }

  @Test
  void whatIsNoPictureIsRefusedWhateverItIsCalled() {
    assertThat(send("<svg onload='x()'/>".getBytes(java.nio.charset.StandardCharsets.US_ASCII)))
        .hasStatus(422)
        .bodyText()
        .contains("neither a JPEG nor a PNG");
    assertThat(send(new byte[0])).hasStatus(422);
  }

  @Test
  void aClosedVisitKeepsThePhotographItHas() throws Exception {
    send(picture("jpeg"));
    visits.close(visits.openOf(unit).orElseThrow().id());
    assertThat(send(picture("png"))).hasStatus(422);
    assertThat(mvc.post().uri(visit + "/photo/remove").with(csrf())).hasStatus(422);
    assertThat(mvc.get().uri(visit + "/photo")).hasStatusOk();
    assertThat(page(visit)).doesNotContain("Replace it");
  }

  @Test
  @WithAnonymousUser
  void aStrangerSeesNone() {
    assertThat(mvc.get().uri(visit + "/photo")).hasStatus(302);
  }

  private String page(String address) throws Exception {
    MvcTestResult result = mvc.get().uri(address).exchange();
    assertThat(result).hasStatusOk();
    String page = result.getResponse().getContentAsString();
    assertThat(page).doesNotContain("??");
    return page;
  }

  private MvcTestResult send(byte[] bytes) {
    var request = mvc.post().uri(visit + "/photo").multipart();
    request.file(new MockMultipartFile("photo", "plate.jpg", "image/jpeg", bytes));
    return request.with(csrf()).exchange();
  }

  private static byte[] picture(String format) throws IOException {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    ImageIO.write(new BufferedImage(40, 30, BufferedImage.TYPE_INT_RGB), format, out);
    return out.toByteArray();
  }
}
