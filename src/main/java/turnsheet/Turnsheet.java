package turnsheet;

import java.io.IOException;
import java.util.Arrays;
import org.springframework.boot.SpringApplication;
import org.springframework.boot.SpringBootConfiguration;
import org.springframework.boot.autoconfigure.EnableAutoConfiguration;
import org.springframework.context.ConfigurableApplicationContext;
import org.springframework.context.annotation.ComponentScan;
import org.springframework.context.annotation.Import;
import turnsheet.cli.MeasureCommand;
import turnsheet.demo.SampleFolder;

/** Starts what the command line asks for. */
@SpringBootConfiguration
@EnableAutoConfiguration
@Import(ServiceConfig.class)
// the packages that have components; searching the others as well costs the start
@ComponentScan({
  "turnsheet.access",
  "turnsheet.capture",
  "turnsheet.demo",
  "turnsheet.job",
  "turnsheet.reading",
  "turnsheet.report",
  "turnsheet.share",
  "turnsheet.shop",
  "turnsheet.web"
})
public class Turnsheet {

  /**
   * {@code measure} works on one file and {@code samples} writes the sample folder; both come first
   * so that they pay for nothing of the service. {@code serve}, or nothing, starts the service,
   * {@code demo} the service with the invented shop, {@code rehearse} the service for a moment.
   */
  public static void main(String[] args) throws IOException {
    String first = args.length == 0 ? "serve" : args[0];
    String[] rest = args.length == 0 ? args : Arrays.copyOfRange(args, 1, args.length);
    switch (first) {
      case "measure" -> System.exit(MeasureCommand.run(rest));
      case "samples" -> SampleFolder.run(rest);
      case "demo" -> serve(rest, "demo");
      case "rehearse" -> Rehearsal.run(serve(rest));
      case "serve" -> serve(rest);
      default -> serve(args);
    }
  }

  private static ConfigurableApplicationContext serve(String[] args, String... profiles) {
    SpringApplication application = new SpringApplication(Turnsheet.class);
    application.setAdditionalProfiles(profiles);
    return application.run(args);
  }
}
