package blochbound.casefile;

import java.util.List;

/** A node of a case file with its place. */
sealed interface YamlNode permits YamlScalar, YamlNode.Mapping, YamlNode.Sequence {
  /** The text it stands in. */
  SourceText source();

  /** Line of its first character, counted from 1. */
  int line();

  /** Column of its first character, counted from 1. */
  int column();

  /** A fault at the node's first character. */
  default Fault fault(String message) {
    return source().fault(line(), column(), message);
  }

  /** The node as a scalar; {@code what} tells what was expected. */
  default YamlScalar asScalar(String what) {
    throw FaultSignal.of(fault("expected " + what + ", not a list or a mapping"));
  }

  /** The node as a mapping; {@code what} tells what was expected. */
  default Mapping asMapping(String what) {
    throw FaultSignal.of(fault("expected " + what));
  }

  /** The node as a sequence; {@code what} tells what was expected. */
  default Sequence asSequence(String what) {
    throw FaultSignal.of(fault("expected " + what));
  }

  /** Tells whether it is a scalar without any text. */
  default boolean isNothing() {
    return false;
  }

  /**
   * A mapping.
   *
   * @param source the text it stands in
   * @param line its line
   * @param column its column
   * @param entries its entries in order, with distinct keys
   */
  record Mapping(SourceText source, int line, int column, List<Entry> entries) implements YamlNode {
    @Override
    public Mapping asMapping(String what) {
      return this;
    }
  }

  /**
   * An entry of a mapping.
   *
   * @param key its key
   * @param value its value
   */
  record Entry(YamlScalar key, YamlNode value) {}

  /**
   * A sequence.
   *
   * @param source the text it stands in
   * @param line its line
   * @param column its column
   * @param items its items in order
   */
  record Sequence(SourceText source, int line, int column, List<YamlNode> items)
      implements YamlNode {
    @Override
    public Sequence asSequence(String what) {
      return this;
    }
  }
}
