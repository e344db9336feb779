package turnsheet;

import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.classes;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static com.tngtech.archunit.library.dependencies.SlicesRuleDefinition.slices;
import static org.assertj.core.api.Assertions.assertThat;

import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import java.util.List;
import java.util.stream.Stream;
import org.jspecify.annotations.NullMarked;
import org.junit.jupiter.api.Test;
import org.springframework.boot.autoconfigure.SpringBootApplication;
import org.springframework.stereotype.Component;

/** The house rules of the packages: who may know whom. */
class ArchitectureTest {

  /** From the ground up: a row may use the rows before it, never one after. */
  private static final List<String> ROWS =
      List.of(
          "turnsheet.core.signal",
          "turnsheet.core.format",
          "turnsheet.core.dsp",
          "turnsheet.core.stats",
          "turnsheet.core.measure",
          "turnsheet.core.diagnose",
          "turnsheet.core.synth",
          "turnsheet.document",
          "turnsheet.cli",
          "turnsheet.web",
          "turnsheet.access",
          "turnsheet.job",
          "turnsheet.shop",
          "turnsheet.capture",
          "turnsheet.reading",
          "turnsheet.evidence",
          "turnsheet.pair",
          "turnsheet.trial",
          "turnsheet.bench",
          "turnsheet.report",
          "turnsheet.share",
          "turnsheet.exchange",
          "turnsheet.demo");

  private static final JavaClasses CLASSES =
      new ClassFileImporter()
          .withImportOption(new ImportOption.DoNotIncludeTests())
          .withImportOption(location -> !location.contains("__") && !location.contains("$$"))
          .importPackages("turnsheet");

  /** A component elsewhere would be missing from the service without a word. */
  @Test
  void everyComponentLivesWhereTheStartSearches() {
    String[] searched =
        Stream.concat(
                Stream.of(
                        Turnsheet.class
                            .getAnnotation(SpringBootApplication.class)
                            .scanBasePackages())
                    .map(p -> p + ".."),
                Stream.of("turnsheet", "turnsheet.demo"))
            .toArray(String[]::new);
    classes()
        .that()
        .areMetaAnnotatedWith(Component.class)
        .should()
        .resideInAnyPackage(searched)
        .check(CLASSES);
  }

  @Test
  void theScanSeesTheProject() {
    assertThat(CLASSES.size()).isGreaterThan(40);
  }

  @Test
  void eachRowUsesOnlyRowsBeforeIt() {
    for (int i = 0; i < ROWS.size(); i++) {
      String[] later =
          ROWS.subList(i + 1, ROWS.size()).stream().map(p -> p + "..").toArray(String[]::new);
      if (later.length > 0) {
        noClasses()
            .that()
            .resideInAPackage(ROWS.get(i) + "..")
            .should()
            .dependOnClassesThat()
            .resideInAnyPackage(later)
            .allowEmptyShould(true)
            .check(CLASSES);
      }
    }
  }

  @Test
  void signalFormatDspAndStatsDoNotKnowEachOtherBeyondSignals() {
    noClasses()
        .that()
        .resideInAPackage("turnsheet.core.stats..")
        .should()
        .dependOnClassesThat()
        .resideInAnyPackage("turnsheet.core.format..", "turnsheet.core.dsp..")
        .allowEmptyShould(true)
        .check(CLASSES);
    noClasses()
        .that()
        .resideInAPackage("turnsheet.core.dsp..")
        .should()
        .dependOnClassesThat()
        .resideInAPackage("turnsheet.core.format..")
        .allowEmptyShould(true)
        .check(CLASSES);
  }

  @Test
  void coreIsPlainJava() {
    classes()
        .that()
        .resideInAPackage("turnsheet.core..")
        .should()
        .onlyDependOnClassesThat()
        .resideInAnyPackage(
            "java..",
            "turnsheet.core..",
            "org.jspecify..",
            "org.jtransforms..",
            "pl.edu.icm.jlargearrays..",
            "org.hipparchus..",
            "de.siegmar.fastcsv..")
        .check(CLASSES);
  }

  @Test
  void coreHasNoClockNoFilesNoLogging() {
    noClasses()
        .that()
        .resideInAPackage("turnsheet.core..")
        .should()
        .dependOnClassesThat()
        .resideInAnyPackage("java.time..", "java.util.logging..", "java.nio.file..", "java.sql..")
        .check(CLASSES);
    noClasses()
        .that()
        .resideInAPackage("turnsheet.core..")
        .should()
        .dependOnClassesThat()
        .haveFullyQualifiedName("java.io.File")
        .check(CLASSES);
  }

  @Test
  void onlyTheClockTellsTheTime() {
    noClasses()
        .should()
        .callMethod(java.time.Instant.class, "now")
        .orShould()
        .callMethod(System.class, "currentTimeMillis")
        .orShould()
        .callMethod(java.time.LocalDate.class, "now")
        .check(CLASSES);
  }

  @Test
  void onlyTheShellCommandAndTheConsolePrint() {
    noClasses()
        .that()
        .resideOutsideOfPackages("turnsheet.cli..", "turnsheet.access..", "turnsheet.demo..")
        .should()
        .accessField(System.class, "out")
        .check(CLASSES);
  }

  @Test
  void onlyWebPackagesKnowSpringWeb() {
    noClasses()
        .that()
        .resideOutsideOfPackages("turnsheet", "..web..")
        .should()
        .dependOnClassesThat()
        .resideInAPackage("org.springframework.web..")
        .check(CLASSES);
  }

  @Test
  void packagesHaveNoCycles() {
    slices().matching("turnsheet.(**)").should().beFreeOfCycles().check(CLASSES);
  }

  @Test
  void everyPackageIsNullMarked() {
    CLASSES.stream()
        .map(c -> c.getPackage())
        .distinct()
        .forEach(p -> assertThat(p.isAnnotatedWith(NullMarked.class)).as(p.getName()).isTrue());
  }
}
