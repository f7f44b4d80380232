package blochbound.casefile;

import blochbound.model.DesignCase;
import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;

/**
 * Reads case files of the format {@code blochbound-case/1}: YAML 1.2, one device, its tolerances
 * and its requirements.
 *
 * <p>Guarantee: decimals and units are kept exactly, matrices and states carry proved error bounds,
 * and every rate, divisor and square root is proved to be defined on the whole tolerance ball.
 * Nothing in the file is ignored.
 */
public final class CaseReader {
  /** Largest case file in bytes. */
  public static final int MOST_BYTES = 1 << 20;

  /** Longest line in characters; the YAML scanner is slow on longer ones. */
  static final int LONGEST_LINE = 1 << 15;

  private static final int BYTE_ORDER_MARK = 0xFEFF;

  /** Whether a case must state requirements. */
  public enum RequirementRule {
    /** A case without requirements is read as it is. */
    OPTIONAL,
    /** A case without requirements is a fault. */
    REQUIRED
  }

  private CaseReader() {}

  /**
   * Reads a case file, with or without requirements.
   *
   * @throws CaseFaultException with all faults, when there is one
   */
  public static DesignCase read(Path file) throws CaseFaultException {
    return read(file, RequirementRule.OPTIONAL);
  }

  /**
   * Reads a case file.
   *
   * @throws CaseFaultException with all faults, when there is one
   */
  public static DesignCase read(Path file, RequirementRule rule) throws CaseFaultException {
    String name = file.toString();
    Path parent = file.toAbsolutePath().getParent();
    return read(bytes(file), name, parent == null ? Path.of("") : parent, rule);
  }

  /**
   * Reads the text of a case.
   *
   * @param text the content of a case file
   * @param name how faults name it
   * @param directory where the names of referenced files start
   * @throws CaseFaultException with all faults, when there is one
   */
  public static DesignCase read(String text, String name, Path directory, RequirementRule rule)
      throws CaseFaultException {
    return read(text.getBytes(StandardCharsets.UTF_8), name, directory, rule);
  }

  private static DesignCase read(byte[] bytes, String name, Path directory, RequirementRule rule)
      throws CaseFaultException {
    FaultLog log = new FaultLog();
    Optional<SourceText> source = log.attempt(() -> text(bytes, name));
    log.throwIfAny();
    Optional<YamlNode> root = YamlReader.read(source.orElseThrow(), log);
    log.throwIfAny();
    ReferencedFiles files = new ReferencedFiles(directory, name, bytes);
    Optional<DesignCase> read =
        log.attempt(() -> new CaseAssembly(root.orElseThrow(), files, log).read(rule))
            .flatMap(c -> c);
    log.throwIfAny();
    return read.orElseThrow();
  }

  private static byte[] bytes(Path file) throws CaseFaultException {
    try (InputStream in = Files.newInputStream(file)) {
      return in.readNBytes(MOST_BYTES + 1);
    } catch (IOException e) {
      String reason = Files.isDirectory(file) ? "it is a directory" : ReferencedFiles.reason(e);
      String message = "the file cannot be read: " + reason;
      throw new CaseFaultException(List.of(new Fault(file.toString(), 1, 1, message)));
    }
  }

  /** Decodes the bytes and checks their number and their characters. */
  private static SourceText text(byte[] bytes, String name) {
    if (bytes.length > MOST_BYTES) {
      throw FaultSignal.of(
          new Fault(name, 1, 1, "the file is over " + MOST_BYTES + " bytes (1 MiB) long"));
    }
    String decoded;
    try {
      decoded = StandardCharsets.UTF_8.newDecoder().decode(ByteBuffer.wrap(bytes)).toString();
    } catch (CharacterCodingException e) {
      throw FaultSignal.of(new Fault(name, 1, 1, "the file is not encoded in UTF-8"));
    }
    boolean marked = !decoded.isEmpty() && decoded.charAt(0) == BYTE_ORDER_MARK;
    SourceText source = SourceText.of(name, marked ? decoded.substring(1) : decoded);
    checkCharacters(source);
    return source;
  }

  private static void checkCharacters(SourceText source) {
    int column = 0;
    for (int i = 0; i < source.length(); i++) {
      column = source.endsLine(i) ? 0 : column + 1;
      if (column > LONGEST_LINE) {
        throw FaultSignal.of(
            source.faultAt(
                i, "a line of more than " + LONGEST_LINE + " characters; break the line"));
      }
      if (!isPrintable(source.at(i))) {
        String code = String.format("U+%04X", source.at(i));
        throw FaultSignal.of(
            source.faultAt(i, "the character " + code + " is not allowed in YAML text"));
      }
    }
  }

  /** The printable characters of YAML 1.2, production 1. */
  private static boolean isPrintable(int c) {
    return c == '\t'
        || c == '\n'
        || c == '\r'
        || (c >= 0x20 && c <= 0x7E)
        || c == 0x85
        || (c >= 0xA0 && c <= 0xD7FF)
        || (c >= 0xE000 && c <= 0xFFFD && c != BYTE_ORDER_MARK)
        || c >= 0x10000;
  }
}
