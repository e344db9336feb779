package turnsheet;

import java.util.Arrays;
import org.springframework.boot.SpringApplication;
import org.springframework.boot.autoconfigure.SpringBootApplication;
import turnsheet.cli.MeasureCommand;

/** Starts what the command line asks for. */
@SpringBootApplication
public class Turnsheet {

  /**
   * {@code measure} works on one file and ends; {@code serve}, or nothing, starts the service. The
   * shell command comes first so that it pays for nothing of the service.
   */
  public static void main(String[] args) {
    String first = args.length == 0 ? "serve" : args[0];
    if (first.equals("measure")) {
      System.exit(MeasureCommand.run(Arrays.copyOfRange(args, 1, args.length)));
    }
    boolean named = args.length > 0 && first.equals("serve");
    SpringApplication.run(Turnsheet.class, named ? Arrays.copyOfRange(args, 1, args.length) : args);
  }
}
