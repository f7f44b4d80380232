package blochbound.casefile;

import blochbound.casefile.YamlNode.Entry;
import blochbound.casefile.YamlNode.Mapping;
import blochbound.casefile.YamlNode.Sequence;
import blochbound.casefile.YamlScalar.Style;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.Iterator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.snakeyaml.engine.v2.api.LoadSettings;
import org.snakeyaml.engine.v2.api.lowlevel.Parse;
import org.snakeyaml.engine.v2.events.AliasEvent;
import org.snakeyaml.engine.v2.events.CollectionStartEvent;
import org.snakeyaml.engine.v2.events.Event;
import org.snakeyaml.engine.v2.events.NodeEvent;
import org.snakeyaml.engine.v2.events.ScalarEvent;
import org.snakeyaml.engine.v2.exceptions.Mark;
import org.snakeyaml.engine.v2.exceptions.MarkedYamlEngineException;
import org.snakeyaml.engine.v2.exceptions.YamlEngineException;

/**
 * Reads YAML text into nodes with places; scalars stay text.
 *
 * <p>Works on the events of the parser rather than on composed nodes, so that tags and aliases are
 * seen as written and deep nesting is stopped before it is built.
 */
final class YamlReader {
  /** Deepest allowed nesting. */
  static final int MOST_LEVELS = 32;

  private static final int CODE_POINT_LIMIT = 1 << 22;

  private final SourceText source;
  private final FaultLog log;
  private final Iterator<Event> events;

  private YamlReader(SourceText source, FaultLog log, Iterator<Event> events) {
    this.source = source;
    this.log = log;
    this.events = events;
  }

  /** Reads the only document; empty when a fault was logged. */
  static Optional<YamlNode> read(SourceText source, FaultLog log) {
    String text = new String(source.characters(), 0, source.length());
    LoadSettings settings = LoadSettings.builder().setCodePointLimit(CODE_POINT_LIMIT).build();
    try {
      Iterator<Event> events = new Parse(settings).parseString(text).iterator();
      return log.attempt(() -> new YamlReader(source, log, events).document());
    } catch (MarkedYamlEngineException e) {
      log.add(new YamlDamage(source).explain(e));
    } catch (YamlEngineException e) {
      log.add(source.fault(1, 1, "the file is no YAML 1.2 text: " + e.getMessage()));
    }
    return Optional.empty();
  }

  private YamlNode document() {
    Event event = next();
    while (event.getEventId() == Event.ID.StreamStart) {
      event = next();
    }
    if (event.getEventId() == Event.ID.StreamEnd) {
      throw FaultSignal.of(
          source.fault(1, 1, "the file is empty; it must hold a case, see `format`"));
    }
    YamlNode root = node(next(), 1);
    next();
    Event after = next();
    if (after.getEventId() != Event.ID.StreamEnd) {
      throw FaultSignal.of(
          fault(after, "a second document starts here; a case file holds one document"));
    }
    return root;
  }

  private Event next() {
    return events.next();
  }

  private YamlNode node(Event event, int depth) {
    if (depth > MOST_LEVELS) {
      throw FaultSignal.of(fault(event, "nested more than " + MOST_LEVELS + " levels deep"));
    }
    if (event instanceof AliasEvent alias) {
      String name = "*" + alias.getAlias().getValue();
      log.add(
          fault(
              event,
              "`"
                  + name
                  + "` is an alias of YAML, which a case file must not have; text that begins"
                  + " with * must be quoted"));
      return scalar(event, Style.PLAIN, name);
    }
    checkUndecorated((NodeEvent) event);
    if (event instanceof ScalarEvent scalar) {
      return scalar(event, style(scalar), scalar.getValue());
    }
    return event.getEventId() == Event.ID.SequenceStart
        ? sequence(event, depth)
        : mapping(event, depth);
  }

  /** Logs anchors and tags. */
  private void checkUndecorated(NodeEvent event) {
    event
        .getAnchor()
        .ifPresent(
            anchor ->
                log.add(
                    fault(
                        event,
                        "`&"
                            + anchor.getValue()
                            + "` is an anchor of YAML, which a case file must not have; text that"
                            + " begins with & must be quoted")));
    Optional<String> tag =
        event instanceof ScalarEvent scalar
            ? scalar.getTag()
            : ((CollectionStartEvent) event).getTag();
    tag.ifPresent(
        name ->
            log.add(
                fault(
                    event,
                    "`"
                        + name.replace("tag:yaml.org,2002:", "!!")
                        + "` is a tag of YAML, which a case file must not have; text that begins"
                        + " with ! must be quoted")));
  }

  private Sequence sequence(Event start, int depth) {
    List<YamlNode> items = new ArrayList<>();
    for (Event e = next(); e.getEventId() != Event.ID.SequenceEnd; e = next()) {
      items.add(node(e, depth + 1));
    }
    return new Sequence(source, line(start), column(start), List.copyOf(items));
  }

  private Mapping mapping(Event start, int depth) {
    List<Entry> entries = new ArrayList<>();
    Map<String, YamlScalar> seen = new HashMap<>();
    for (Event e = next(); e.getEventId() != Event.ID.MappingEnd; e = next()) {
      YamlNode key = node(e, depth + 1);
      YamlNode value = node(next(), depth + 1);
      if (!(key instanceof YamlScalar name)) {
        log.add(key.fault("a key must be a word, not a list or a mapping"));
        continue;
      }
      YamlScalar first = seen.putIfAbsent(name.text(), name);
      if (first != null) {
        log.add(name.fault("the key `" + name.text() + "` is already given at " + place(first)));
        continue;
      }
      YamlDamage.inEntry(name, value).ifPresent(log::add);
      entries.add(new Entry(name, value));
    }
    return new Mapping(source, line(start), column(start), List.copyOf(entries));
  }

  private static String place(YamlScalar scalar) {
    return "line " + scalar.line() + ", column " + scalar.column();
  }

  private YamlScalar scalar(Event event, Style style, String text) {
    int index = event.getStartMark().map(Mark::getIndex).orElse(0);
    return new YamlScalar(source, index, line(event), column(event), style, text);
  }

  private static Style style(ScalarEvent event) {
    return switch (event.getScalarStyle()) {
      case SINGLE_QUOTED -> Style.SINGLE_QUOTED;
      case DOUBLE_QUOTED, JSON_SCALAR_STYLE -> Style.DOUBLE_QUOTED;
      case LITERAL, FOLDED -> Style.BLOCK;
      case PLAIN -> Style.PLAIN;
    };
  }

  private Fault fault(Event event, String message) {
    return source.fault(line(event), column(event), message);
  }

  private static int line(Event event) {
    return event.getStartMark().map(m -> m.getLine() + 1).orElse(1);
  }

  private static int column(Event event) {
    return event.getStartMark().map(m -> m.getColumn() + 1).orElse(1);
  }
}
