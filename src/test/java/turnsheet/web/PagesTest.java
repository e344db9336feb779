package turnsheet.web;

import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.status;

import org.junit.jupiter.api.Test;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.test.web.servlet.MockMvc;
import turnsheet.testing.AsOwner;
import turnsheet.testing.ServiceTest;

@ServiceTest
class PagesTest {
  @Autowired MockMvc mvc;

  @Test
  @AsOwner
  void unknownAddressIsNotFound() throws Exception {
    mvc.perform(get("/no-such-page")).andExpect(status().isNotFound());
  }
}
