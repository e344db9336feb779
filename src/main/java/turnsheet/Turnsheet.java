package turnsheet;

import org.springframework.boot.SpringApplication;
import org.springframework.boot.autoconfigure.SpringBootApplication;

/** Starts what the command line asks for. */
@SpringBootApplication
public class Turnsheet {

  public static void main(String[] args) {
    SpringApplication.run(Turnsheet.class, args);
  }
}
