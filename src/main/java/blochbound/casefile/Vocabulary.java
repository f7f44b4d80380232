package blochbound.casefile;

import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;
import java.util.regex.Pattern;

/** Words of the case file: names, labels, reserved words, and the nearest known word. */
final class Vocabulary {
  static final List<String> FUNCTIONS = List.of("sqrt", "exp", "sin", "cos", "adj");
  static final List<String> CONSTANTS = List.of("i", "pi");
  static final List<String> LOCAL_OPERATORS = List.of("X", "Y", "Z", "lower", "raise", "number");

  private static final Pattern NAME = Pattern.compile("[A-Za-z][A-Za-z0-9_]*");
  private static final Pattern LABEL = Pattern.compile("[A-Za-z0-9_+-]+");
  private static final int LONGEST_NAME = 64;

  private Vocabulary() {}

  /** Words that no parameter, site or operator may take as its name. */
  static boolean isReserved(String word) {
    return FUNCTIONS.contains(word)
        || CONSTANTS.contains(word)
        || LOCAL_OPERATORS.contains(word)
        || Set.of("steady", "end", "any").contains(word)
        || UnitTable.WORDS.contains(word);
  }

  /** Tells whether a word may be a name, reserved or not. */
  static boolean isName(String word) {
    return word.length() <= LONGEST_NAME && NAME.matcher(word).matches();
  }

  /** Tells whether a word may be a level label. */
  static boolean isLabel(String word) {
    return word.length() <= LONGEST_NAME && LABEL.matcher(word).matches();
  }

  /** Text {@code ; the nearest known is `...`} when a known word is near, otherwise nothing. */
  static String nearest(String word, Collection<String> known) {
    return nearestWord(word, known).map(w -> "; the nearest known is `" + w + "`").orElse("");
  }

  /** The first of the nearest known words, when it is near. */
  static Optional<String> nearestWord(String word, Collection<String> known) {
    // A word of one letter is near to itself only, whatever its case.
    int least = word.length() < 2 ? 1 : 1 + Math.min(3, (word.length() + 2) / 3);
    Optional<String> best = Optional.empty();
    for (String candidate : known) {
      boolean differsInCaseOnly =
          word.toLowerCase(Locale.ROOT).equals(candidate.toLowerCase(Locale.ROOT));
      int distance = differsInCaseOnly ? 0 : distance(word, candidate, least);
      if (distance < least) {
        least = distance;
        best = Optional.of(candidate);
      }
    }
    return best;
  }

  /** Edit distance with insertions, deletions and replacements, cut at {@code limit}. */
  private static int distance(String a, String b, int limit) {
    if (Math.abs(a.length() - b.length()) >= limit) {
      return limit;
    }
    int[] row = new int[b.length() + 1];
    for (int j = 0; j <= b.length(); j++) {
      row[j] = j;
    }
    for (int i = 1; i <= a.length(); i++) {
      int diagonal = row[0];
      row[0] = i;
      for (int j = 1; j <= b.length(); j++) {
        int replaced = diagonal + (a.charAt(i - 1) == b.charAt(j - 1) ? 0 : 1);
        diagonal = row[j];
        row[j] = Math.min(replaced, 1 + Math.min(row[j], row[j - 1]));
      }
    }
    return row[b.length()];
  }

  /** Some known words as a list for messages, cut when there are many. */
  static String list(Collection<String> words) {
    List<String> shown = new ArrayList<>(words);
    int most = 24;
    return shown.isEmpty()
        ? "none"
        : String.join(", ", shown.subList(0, Math.min(most, shown.size())))
            + (shown.size() > most ? ", ..." : "");
  }
}
