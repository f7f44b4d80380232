package blochbound;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.tngtech.archunit.core.domain.Dependency;
import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.domain.JavaField;
import com.tngtech.archunit.core.domain.JavaModifier;
import com.tngtech.archunit.core.domain.JavaPackage;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import com.tngtech.archunit.library.dependencies.SlicesRuleDefinition;
import java.util.Collection;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import java.util.concurrent.atomic.AtomicReference;
import org.jspecify.annotations.NullMarked;
import org.junit.jupiter.api.Test;

/** Holds the order of the packages, the homes of third-party types and the rules for statics. */
class ArchitectureTest {
  /** From left to right; a package imports only packages of the groups to its left. */
  private static final List<Set<String>> ORDER =
      List.of(
          Set.of("check"),
          Set.of("interval"),
          Set.of("linalg"),
          Set.of("model"),
          Set.of("generator"),
          Set.of("measure"),
          Set.of("certificate"),
          Set.of("bound", "search", "sample"),
          Set.of("study"),
          Set.of("casefile", "report", "proof"),
          Set.of("cli"));

  /** Packages that may import less than their place in the order allows. */
  private static final Map<String, Set<String>> NARROWED =
      Map.of("proof", Set.of("model", "interval", "certificate"));

  private static final Set<String> EVERYWHERE = Set.of("*");

  /** Where the types of a third-party package may be used; the longest prefix decides. */
  private static final Map<String, Set<String>> HOMES =
      Map.ofEntries(
          Map.entry("org.jspecify", EVERYWHERE),
          Map.entry("org.ejml", Set.of("linalg")),
          Map.entry("org.ojalgo", Set.of("linalg", "bound")),
          Map.entry("org.ojalgo.matrix", Set.of("linalg")),
          Map.entry("org.ojalgo.optimisation", Set.of("bound")),
          Map.entry("org.apache.commons.math3", Set.of("search", "study", "sample")),
          Map.entry("org.apache.commons.math3.fraction", Set.of("interval", "model")),
          Map.entry("org.snakeyaml", Set.of("casefile", "report", "cli")),
          Map.entry("com.fasterxml.jackson", Set.of("casefile", "report", "cli")),
          Map.entry("picocli", Set.of("cli")));

  private static final JavaClasses CLASSES =
      new ClassFileImporter()
          .withImportOption(ImportOption.Predefined.DO_NOT_INCLUDE_TESTS)
          .importPackages("blochbound");

  /** Guard of all other rules: they would hold for no classes at all. */
  @Test
  void theRulesSeeTheClassesOfThePackagesEverythingRestsOn() {
    Set<String> seen = new TreeSet<>();
    CLASSES.forEach(c -> seen.add(place(c.getPackageName())));
    assertTrue(
        seen.containsAll(Set.of("check", "interval", "linalg", "model")), "saw only " + seen);
  }

  @Test
  void everyPackageHasAPlaceInTheOrder() {
    Set<String> unknown = new TreeSet<>();
    for (JavaClass c : CLASSES) {
      if (rank(place(c.getPackageName())) < 0) {
        unknown.add(c.getName());
      }
    }
    assertEquals(Set.of(), unknown);
  }

  @Test
  void packagesImportOnlyPackagesToTheirLeft() {
    Set<String> broken = new TreeSet<>();
    for (Dependency d : dependencies()) {
      String to = d.getTargetClass().getPackageName();
      String from = d.getOriginClass().getPackageName();
      if (isOurs(to) && !mayImport(place(from), place(to))) {
        broken.add(d.getDescription());
      }
    }
    assertEquals(Set.of(), broken);
  }

  @Test
  void thirdPartyTypesStayAtHome() {
    Set<String> broken = new TreeSet<>();
    for (Dependency d : dependencies()) {
      String to = d.getTargetClass().getBaseComponentType().getPackageName();
      boolean platform = to.isEmpty() || to.startsWith("java.");
      if (!platform && !isOurs(to) && !mayUse(place(d.getOriginClass().getPackageName()), to)) {
        broken.add(d.getDescription());
      }
    }
    assertEquals(Set.of(), broken);
  }

  @Test
  void packagesFormNoCycles() {
    SlicesRuleDefinition.slices()
        .matching("blochbound.(**)")
        .should()
        .beFreeOfCycles()
        .check(CLASSES);
  }

  @Test
  void everyPackageHasAPageAndIsNullMarked() {
    Set<String> bare = new TreeSet<>();
    for (JavaClass c : CLASSES) {
      JavaPackage home = c.getPackage();
      if (!home.isAnnotatedWith(NullMarked.class)) {
        bare.add(home.getName());
      }
    }
    assertEquals(Set.of(), bare);
  }

  @Test
  void nothingStaticCanChange() {
    Set<String> mutable = new TreeSet<>();
    for (JavaClass c : CLASSES) {
      for (JavaField f : c.getFields()) {
        if (isOwnStatic(f) && (!f.getModifiers().contains(JavaModifier.FINAL) || isOpen(f))) {
          mutable.add(f.getFullName());
        }
      }
    }
    assertEquals(Set.of(), mutable);
  }

  // The rules themselves can fail: each claim below is a pair that must be told apart.

  @Test
  void provingAndAttainingNeverImportEachOther() {
    assertFalse(mayImport("bound", "search"));
    assertFalse(mayImport("search", "bound"));
    assertFalse(mayImport("sample", "bound"));
    assertFalse(mayImport("sample", "search"));
    assertTrue(mayImport("study", "bound"));
    assertTrue(mayImport("study", "search"));
  }

  @Test
  void theProofCheckerSharesNoNumericalCodeWithTheProver() {
    assertTrue(mayImport("proof", "certificate"));
    assertFalse(mayImport("proof", "generator"));
    assertFalse(mayImport("proof", "linalg"));
    assertFalse(mayImport("proof", "bound"));
  }

  @Test
  void importsToTheRightAndUnknownPackagesAreRefused() {
    assertFalse(mayImport("interval", "linalg"));
    assertTrue(mayImport("linalg", "interval"));
    assertFalse(mayImport("cli", "elsewhere"));
    assertFalse(mayImport("elsewhere", "check"));
  }

  @Test
  void theLongestPrefixDecidesWhereAThirdPartyTypeMayBeUsed() {
    assertTrue(mayUse("model", "org.apache.commons.math3.fraction"));
    assertFalse(mayUse("model", "org.apache.commons.math3.optim"));
    assertFalse(mayUse("search", "org.apache.commons.math3.fraction"));
    assertFalse(mayUse("linalg", "org.ojalgo.optimisation.convex"));
    assertFalse(mayUse("bound", "org.ojalgo.matrix.store"));
    assertFalse(mayUse("cli", "org.unheardof"));
    assertFalse(mayUse("bound", "picocli"));
  }

  private static Collection<Dependency> dependencies() {
    return CLASSES.stream().flatMap(c -> c.getDirectDependenciesFromSelf().stream()).toList();
  }

  private static boolean isOurs(String packageName) {
    return packageName.equals("blochbound") || packageName.startsWith("blochbound.");
  }

  /** The first package name below the root: {@code study} for {@code blochbound.study.margin}. */
  private static String place(String packageName) {
    String[] parts = packageName.split("\\.", -1);
    return parts.length > 1 ? parts[1] : "";
  }

  private static int rank(String place) {
    for (int i = 0; i < ORDER.size(); i++) {
      if (ORDER.get(i).contains(place)) {
        return i;
      }
    }
    return -1;
  }

  private static boolean mayImport(String from, String to) {
    if (from.equals(to)) {
      return rank(from) >= 0;
    }
    Set<String> narrowed = NARROWED.get(from);
    boolean isAllowed = narrowed == null || narrowed.contains(to);
    return isAllowed && rank(to) >= 0 && rank(to) < rank(from);
  }

  private static boolean mayUse(String place, String thirdParty) {
    String best = "";
    for (String prefix : HOMES.keySet()) {
      boolean fits = thirdParty.equals(prefix) || thirdParty.startsWith(prefix + ".");
      best = fits && prefix.length() > best.length() ? prefix : best;
    }
    Set<String> homes = HOMES.getOrDefault(best, Set.of());
    return homes.contains(place) || homes.equals(EVERYWHERE);
  }

  /** Static fields that the sources declare; the compiler and coverage add synthetic ones. */
  private static boolean isOwnStatic(JavaField field) {
    return field.getModifiers().contains(JavaModifier.STATIC)
        && !field.getModifiers().contains(JavaModifier.SYNTHETIC)
        && !field.getName().startsWith("$");
  }

  /** Tells whether others can reach the field and change what it holds. */
  private static boolean isOpen(JavaField field) {
    boolean isReachable = !field.getModifiers().contains(JavaModifier.PRIVATE);
    JavaClass type = field.getRawType();
    boolean isContainer =
        !type.isInterface()
            && (type.isAssignableTo(Collection.class) || type.isAssignableTo(Map.class));
    boolean isAtomic = type.getPackageName().equals(AtomicReference.class.getPackageName());
    return isReachable && (type.isArray() || isContainer || isAtomic);
  }
}
