package turnsheet;

import java.io.IOException;
import java.util.Arrays;
import org.springframework.boot.SpringApplication;
import org.springframework.boot.autoconfigure.SpringBootApplication;
import turnsheet.cli.MeasureCommand;
import turnsheet.demo.SampleFolder;

/** Starts what the command line asks for. */
@SpringBootApplication
public class Turnsheet {

  /**
   * {@code measure} works on one file and {@code samples} writes the sample folder; both come first
   * so that they pay for nothing of the service. {@code serve}, or nothing, starts the service,
   * {@code demo} the service with the invented shop.
   */
  public static void main(String[] args) throws IOException {
    String first = args.length == 0 ? "serve" : args[0];
    String[] rest = args.length == 0 ? args : Arrays.copyOfRange(args, 1, args.length);
    switch (first) {
      case "measure" -> System.exit(MeasureCommand.run(rest));
      case "samples" -> SampleFolder.run(rest);
      case "demo" -> serve(rest, "demo");
      case "serve" -> serve(rest);
      default -> serve(args);
    }
  }

  private static void serve(String[] args, String... profiles) {
    SpringApplication application = new SpringApplication(Turnsheet.class);
    application.setAdditionalProfiles(profiles);
    application.run(args);
  }
}
