package blochbound.casefile;

import blochbound.casefile.Token.Kind;
import blochbound.casefile.Token.Label;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Splits an expression into words with their places. */
final class Lexer {
  private static final Pattern NAME = Pattern.compile("[A-Za-z][A-Za-z0-9_]*");
  private static final String SYMBOLS = "+-*/^()@";

  private final Passage passage;
  private final String text;
  private int position;

  private Lexer(Passage passage) {
    this.passage = passage;
    this.text = passage.scalar().text();
    this.position = passage.from();
  }

  /** All words of a passage, with an end word. */
  static List<Token> tokens(Passage passage) {
    Lexer lexer = new Lexer(passage);
    List<Token> tokens = new ArrayList<>();
    do {
      tokens.add(lexer.next());
    } while (tokens.get(tokens.size() - 1).kind() != Kind.END);
    return tokens;
  }

  private Token next() {
    skipBlanks();
    int at = position;
    if (position >= passage.to()) {
      return new Token(Kind.END, "", List.of(), passage.to());
    }
    char c = text.charAt(position);
    if (c == '|' || c == '<') {
      return labels(c == '|' ? Kind.KET : Kind.BRA, c == '|' ? '>' : '|');
    }
    Matcher number = DecimalText.UNSIGNED.matcher(text).region(position, passage.to());
    if (number.lookingAt()) {
      Optional<String> complaint = DecimalText.complaint(number.group());
      if (complaint.isPresent()) {
        throw passage.fault(at, complaint.get());
      }
      position = number.end();
      return new Token(Kind.NUMBER, number.group(), List.of(), at);
    }
    Matcher name = NAME.matcher(text).region(position, passage.to());
    if (name.lookingAt()) {
      position = name.end();
      return new Token(Kind.NAME, name.group(), List.of(), at);
    }
    if (SYMBOLS.indexOf(c) < 0) {
      throw unknown(at);
    }
    position++;
    if (c == '*' && position < passage.to() && text.charAt(position) == '*') {
      throw passage.fault(at, "`**` is unknown; a power is written with ^");
    }
    return new Token(Kind.SYMBOL, String.valueOf(c), List.of(), at);
  }

  private FaultSignal unknown(int at) {
    String shown = Character.toString(text.codePointAt(at));
    String hint =
        shown.equals(">")
            ? "a ket is written |a,b>, a transition |a><b|"
            : "allowed are names, numbers, + - * / ^ ( ) @, kets |a> and bras <a|";
    return passage.fault(at, "unexpected `" + shown + "`; " + hint);
  }

  private Token labels(Kind kind, char closing) {
    int at = position++;
    List<Label> labels = new ArrayList<>();
    while (true) {
      labels.add(label(kind));
      skipBlanks();
      char c = position < passage.to() ? text.charAt(position) : 0;
      position++;
      if (c == closing) {
        return new Token(kind, text.substring(at, position), List.copyOf(labels), at);
      }
      if (c != ',') {
        throw notClosed(kind, c == 0 ? at : position - 1);
      }
    }
  }

  private Label label(Kind kind) {
    skipBlanks();
    int start = position;
    while (position < passage.to() && Vocabulary.isLabel(text.substring(position, position + 1))) {
      position++;
    }
    if (start == position) {
      throw notClosed(kind, position < passage.to() ? start : passage.to());
    }
    return new Label(text.substring(start, position), start);
  }

  private FaultSignal notClosed(Kind kind, int at) {
    return passage.fault(
        at,
        kind == Kind.KET
            ? "a ket is written |a,b> with labels of letters, digits, _ + -"
            : "a bra is written <a,b| with labels of letters, digits, _ + -");
  }

  private void skipBlanks() {
    while (position < passage.to() && Character.isWhitespace(text.charAt(position))) {
      position++;
    }
  }
}
