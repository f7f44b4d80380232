package blochbound;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotNull;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.List;
import java.util.jar.JarFile;
import java.util.zip.ZipEntry;
import org.junit.jupiter.api.Test;

/** The jar that users run: what it must hold and what it must not. */
class JarIT {
  @Test
  void theManifestNamesTheProgram() throws IOException {
    try (JarFile jar = new JarFile(WholeProgram.jar().toFile())) {
      // [invariant] the class that the build documents as the program
      assertEquals(
          "blochbound.cli.Blochbound",
          jar.getManifest().getMainAttributes().getValue("Main-Class"));
    }
  }

  @Test
  void theProgramStartsAndTellsItsCommands() throws IOException, InterruptedException {
    WholeProgram.Result help = WholeProgram.run(Path.of("."), "--help");
    assertEquals(0, help.exitCode(), help.err());
    assertTrue(help.out().contains("certify"), help.out());
    assertEquals("", help.err());
  }

  @Test
  void theLibrariesAreInside() throws IOException {
    try (JarFile jar = new JarFile(WholeProgram.jar().toFile())) {
      assertNotNull(jar.getEntry("blochbound/interval/Interval.class"));
      assertNotNull(jar.getEntry("picocli/CommandLine.class"));
      assertNotNull(jar.getEntry("org/apache/commons/math3/fraction/BigFraction.class"));
    }
  }

  @Test
  void noSignatureOfAnotherJarIsInside() throws IOException {
    try (JarFile jar = new JarFile(WholeProgram.jar().toFile())) {
      List<String> signatures =
          jar.stream()
              .map(ZipEntry::getName)
              .filter(name -> name.matches("META-INF/[^/]*\\.(SF|DSA|RSA)"))
              .toList();
      assertEquals(List.of(), signatures);
    }
  }

  @Test
  void theNoticeNamesEveryLibraryInside() throws IOException {
    try (JarFile jar = new JarFile(WholeProgram.jar().toFile())) {
      ZipEntry entry = jar.getEntry("META-INF/NOTICE");
      String notice = new String(jar.getInputStream(entry).readAllBytes(), StandardCharsets.UTF_8);
      for (String library :
          List.of("EJML", "Commons Math", "ojAlgo", "picocli", "SnakeYAML Engine", "Jackson")) {
        assertTrue(notice.contains(library), library + " is not named in\n" + notice);
      }
      assertNotNull(jar.getEntry("META-INF/LICENSE"));
    }
  }
}
