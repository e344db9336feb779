package turnsheet;

import java.io.IOException;
import java.net.URL;
import java.util.Arrays;
import org.springframework.boot.SpringApplication;
import org.springframework.boot.autoconfigure.SpringBootApplication;
import org.springframework.context.ConfigurableApplicationContext;
import org.springframework.context.annotation.Import;
import turnsheet.cli.MeasureCommand;
import turnsheet.demo.Demo;
import turnsheet.demo.SampleFolder;

/** Starts what the command line asks for. */
@SpringBootApplication(
    // the packages that have components; searching the others as well costs the start
    scanBasePackages = {
      "turnsheet.access",
      "turnsheet.bench",
      "turnsheet.capture",
      "turnsheet.evidence",
      "turnsheet.exchange",
      "turnsheet.job",
      "turnsheet.pair",
      "turnsheet.reading",
      "turnsheet.report",
      "turnsheet.share",
      "turnsheet.shop",
      "turnsheet.trial",
      "turnsheet.web"
    })
@Import(ServiceConfig.class)
public class Turnsheet {

  private static final String PREPARED = "spring.aot.enabled";

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
      case "demo" -> serveDemo(rest);
      case "rehearse" -> Rehearsal.run(serve(rest));
      case "serve" -> serve(rest);
      default -> serve(args);
    }
  }

  /**
   * The service as it was worked out when it was packaged: the environment still decides every
   * value, but no longer which beans there are. Run from classes, it searches for them.
   */
  private static ConfigurableApplicationContext serve(String[] args) {
    if (System.getProperty(PREPARED) == null && isPrepared()) {
      System.setProperty(PREPARED, "true");
    }
    return new SpringApplication(Turnsheet.class).run(args);
  }

  /** Only in the jar: beside freshly compiled classes the definitions may be of an older build. */
  private static boolean isPrepared() {
    URL prepared = Turnsheet.class.getResource("Turnsheet__ApplicationContextInitializer.class");
    return prepared != null && prepared.getProtocol().equals("jar");
  }

  private static void serveDemo(String[] args) {
    SpringApplication application = new SpringApplication(Turnsheet.class, Demo.class);
    application.setAdditionalProfiles("demo");
    application.run(args);
  }
}
