package blochbound.casefile;

import blochbound.casefile.YamlNode.Entry;
import blochbound.casefile.YamlNode.Mapping;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** The entries of a mapping whose keys are known words. */
final class Fields {
  private final Mapping mapping;
  private final String what;
  private final Map<String, YamlNode> values = new LinkedHashMap<>();
  private final Set<String> misspelt = new HashSet<>();

  /**
   * Logs every unknown key and every key without a value.
   *
   * @param what names the mapping in messages, such as {@code a requirement}
   */
  Fields(Mapping mapping, String what, List<String> known, FaultLog log) {
    this.mapping = mapping;
    this.what = what;
    for (Entry e : mapping.entries()) {
      String key = e.key().text();
      if (!known.contains(key)) {
        Vocabulary.nearestWord(key, known).ifPresent(misspelt::add);
        log.add(
            e.key()
                .fault(
                    "unknown key `"
                        + key
                        + "` in "
                        + what
                        + Vocabulary.nearest(key, known)
                        + "; allowed: "
                        + String.join(", ", known)));
        continue;
      }
      if (e.value().isNothing()) {
        log.add(e.key().fault("`" + key + "` has no value"));
      }
      values.put(key, e.value());
    }
  }

  /** Tells whether the key is there, with or without a value. */
  boolean has(String key) {
    return values.containsKey(key);
  }

  /** The value of a key that may be absent; quietly ends the piece when it has no text. */
  Optional<YamlNode> node(String key) {
    YamlNode value = values.get(key);
    if (value != null && value.isNothing()) {
      throw FaultSignal.following();
    }
    return Optional.ofNullable(value);
  }

  /** The text of a key that may be absent. */
  Optional<YamlScalar> scalar(String key, String expected) {
    return node(key).map(n -> n.asScalar(expected));
  }

  /** The value of a key that must be there; ends quietly when a misspelt key stands for it. */
  YamlNode needed(String key) {
    return node(key)
        .orElseThrow(
            () ->
                isMisspelt(key)
                    ? FaultSignal.following()
                    : fault("`" + key + "` is missing in " + what));
  }

  /** The text of a key that must be there. */
  YamlScalar neededScalar(String key, String expected) {
    return needed(key).asScalar(expected);
  }

  /** Tells whether an unknown key was probably meant to be this one. */
  boolean isMisspelt(String key) {
    return misspelt.contains(key);
  }

  /** A fault of the whole mapping. */
  FaultSignal fault(String message) {
    return FaultSignal.of(mapping.fault(message));
  }
}
