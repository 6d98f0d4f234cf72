package org.annulet.cases;

import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static com.tngtech.archunit.library.GeneralCodingRules.NO_CLASSES_SHOULD_THROW_GENERIC_EXCEPTIONS;
import static com.tngtech.archunit.library.dependencies.SlicesRuleDefinition.slices;
import static org.assertj.core.api.Assertions.assertThat;

import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.domain.JavaModifier;
import com.tngtech.archunit.core.importer.ImportOption;
import com.tngtech.archunit.junit.AnalyzeClasses;
import com.tngtech.archunit.junit.ArchTest;
import com.tngtech.archunit.lang.ArchRule;
import java.io.PrintStream;
import java.util.Set;
import java.util.TreeSet;

/** The directions and habits of DEVELOPERS.md, held against the compiled code of all modules. */
@AnalyzeClasses(packages = "org.annulet", importOptions = ImportOption.DoNotIncludeTests.class)
class HouseRulesTest {
  @ArchTest
  static final ArchRule mesherKnowsNothingOfOurs =
      noClasses()
          .that()
          .resideInAPackage("org.annulet.mesher..")
          .should()
          .dependOnClassesThat()
          .resideInAnyPackage("org.annulet.solver..", "org.annulet.post..", "org.annulet.cases..");

  @ArchTest
  static final ArchRule solverSeesOnlyTheMesh =
      noClasses()
          .that()
          .resideInAPackage("org.annulet.solver..")
          .should()
          .dependOnClassesThat()
          .resideInAnyPackage(
              "org.annulet.mesher.geometry..",
              "org.annulet.mesher.triangulate..",
              "org.annulet.mesher.files..",
              "org.annulet.post..",
              "org.annulet.cases..");

  @ArchTest
  static final ArchRule postKnowsNoCases =
      noClasses()
          .that()
          .resideInAPackage("org.annulet.post..")
          .should()
          .dependOnClassesThat()
          .resideInAPackage("org.annulet.cases..");

  @ArchTest
  static final ArchRule writersHoldNoPhysics =
      noClasses()
          .that()
          .resideInAnyPackage("org.annulet.post.vtk..", "org.annulet.post.chart..")
          .should()
          .dependOnClassesThat()
          .resideInAnyPackage("org.annulet.solver.eigen..", "org.annulet.solver.sparse..");

  @ArchTest
  static final ArchRule packagesFormNoCircle =
      slices().matching("org.annulet.(*).(*)..").should().beFreeOfCycles();

  @ArchTest
  static final ArchRule nothingDrawsWithAwt =
      noClasses().should().dependOnClassesThat().resideInAnyPackage("java.awt..", "javax.swing..");

  @ArchTest
  static final ArchRule onlyTheCommandLineSpeaks =
      noClasses()
          .that()
          .resideOutsideOfPackage("org.annulet.cases.cli..")
          .should()
          .accessField(System.class, "out")
          .orShould()
          .accessField(System.class, "err")
          .orShould()
          .callMethod(Throwable.class, "printStackTrace")
          .orShould()
          .callMethod(Throwable.class, "printStackTrace", PrintStream.class);

  @ArchTest
  static final ArchRule faultsHaveTheirOwnKind = NO_CLASSES_SHOULD_THROW_GENERIC_EXCEPTIONS;

  @ArchTest
  static void everyPackageSaysWhatItIs(JavaClasses all) {
    Set<String> silent = new TreeSet<>();
    for (JavaClass c : all) {
      if (c.getPackage().tryGetPackageInfo().isEmpty()
          && !hasDocumentedPackage(c.getPackageName())) {
        silent.add(c.getPackageName());
      }
    }
    assertThat(silent).isEmpty();
  }

  /** A package-info without annotations leaves no class file; its source is then looked for. */
  private static boolean hasDocumentedPackage(String name) {
    String module = name.split("\\.")[2];
    java.nio.file.Path info =
        java.nio.file.Path.of(
            "..", module, "src/main/java", name.replace('.', '/'), "package-info.java");
    return java.nio.file.Files.isRegularFile(info);
  }

  @ArchTest
  static void nothingStaticCanChange(JavaClasses all) {
    Set<String> mutable = new TreeSet<>();
    for (JavaClass c : all) {
      c.getFields().stream()
          .filter(f -> f.getModifiers().contains(JavaModifier.STATIC))
          .filter(f -> !f.getModifiers().contains(JavaModifier.FINAL))
          .filter(f -> !f.getModifiers().contains(JavaModifier.SYNTHETIC))
          .forEach(f -> mutable.add(f.getFullName()));
    }
    assertThat(mutable).isEmpty();
  }

  @ArchTest
  static void theRulesSeeTheCode(JavaClasses all) {
    assertThat(all.size()).isGreaterThan(40);
    assertThat(all.stream().map(c -> c.getPackageName().split("\\.")[2]).distinct())
        .contains("mesher", "solver", "post", "cases");
  }
}
