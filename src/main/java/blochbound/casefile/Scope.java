package blochbound.casefile;

import blochbound.model.HilbertSpace;
import blochbound.model.Parameter;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** What expressions may refer to: sites, parameters and named operators in one name space. */
final class Scope {
  private enum Kind {
    PARAMETER,
    SITE,
    OPERATOR
  }

  private final UnitTable units;
  private final FaultLog log;
  private final Map<String, Kind> kinds = new HashMap<>();
  private final Map<String, YamlScalar> places = new HashMap<>();
  private final Map<String, Integer> parameterIndex = new LinkedHashMap<>();
  private final List<Optional<Parameter>> parameters = new ArrayList<>();
  private final Map<String, Optional<Value>> operators = new LinkedHashMap<>();
  private final Conditions conditions = new Conditions();
  private final WorkLimit limit;
  private Optional<LocalOperators> sites = Optional.empty();

  Scope(UnitTable units, FaultLog log, WorkLimit limit) {
    this.units = units;
    this.log = log;
    this.limit = limit;
  }

  UnitTable units() {
    return units;
  }

  FaultLog log() {
    return log;
  }

  Conditions conditions() {
    return conditions;
  }

  WorkLimit limit() {
    return limit;
  }

  /** Claims the name of a site. */
  void claimSite(YamlScalar name) {
    claim(name, Kind.SITE);
  }

  /** Sets the sites once all of them are read without a fault. */
  void setSites(HilbertSpace space) {
    sites = Optional.of(new LocalOperators(space));
  }

  /** The sites; ends the piece quietly when they have a fault. */
  LocalOperators sites() {
    return sites.orElseThrow(FaultSignal::following);
  }

  /** Adds a parameter; empty when its entry has a fault. */
  void addParameter(YamlScalar name, Optional<Parameter> parameter) {
    if (claim(name, Kind.PARAMETER)) {
      parameterIndex.put(name.text(), parameters.size());
    }
    parameters.add(parameter);
  }

  /** Adds a named operator; empty when its entry has a fault. */
  void addOperator(YamlScalar name, Optional<Value> value) {
    if (claim(name, Kind.OPERATOR)) {
      operators.put(name.text(), value);
    }
  }

  private boolean claim(YamlScalar name, Kind kind) {
    String text = name.text();
    if (!Vocabulary.isName(text)) {
      log.add(
          name.fault(
              "`"
                  + text
                  + "` is no name; a name is a letter, then letters, digits and _, at most 64"));
      return false;
    }
    if (Vocabulary.isReserved(text)) {
      log.add(name.fault("`" + text + "` is a reserved word; choose another name"));
      return false;
    }
    YamlScalar first = places.putIfAbsent(text, name);
    if (first != null) {
      log.add(
          name.fault(
              "the name `"
                  + text
                  + "` is already taken at line "
                  + first.line()
                  + ", column "
                  + first.column()
                  + "; parameters, sites and operators share one name space"));
      return false;
    }
    kinds.put(text, kind);
    return true;
  }

  /** Position of a parameter, if there is one of that name. */
  Optional<Integer> parameterIndex(String name) {
    return Optional.ofNullable(parameterIndex.get(name));
  }

  /** A parameter; ends the piece quietly when its entry has a fault. */
  Parameter parameter(int index) {
    return parameters.get(index).orElseThrow(FaultSignal::following);
  }

  /** All parameters; ends the piece quietly when one has a fault. */
  List<Parameter> parameters() {
    return parameters.stream().map(p -> p.orElseThrow(FaultSignal::following)).toList();
  }

  /** Says that a name is no parameter. */
  String unknownParameter(String name) {
    return "unknown parameter `"
        + name
        + "`"
        + Vocabulary.nearest(name, parameterIndex.keySet())
        + "; parameters are "
        + Vocabulary.list(parameterIndex.keySet());
  }

  /** Tells whether an operator of that name is known. */
  boolean hasOperator(String name) {
    return operators.containsKey(name);
  }

  /** A named operator; ends the piece quietly when its entry has a fault. */
  Value operator(String name) {
    Optional<Value> value = operators.getOrDefault(name, Optional.empty());
    return value.orElseThrow(FaultSignal::following);
  }

  /** Says that a name is unknown, or why it cannot stand as a value. */
  String unknownName(String name) {
    if (kinds.get(name) == Kind.SITE) {
      return "`" + name + "` is a site; it stands behind @, as in Z@" + name;
    }
    if (Vocabulary.isReserved(name)) {
      return "`" + name + "` cannot stand here";
    }
    List<String> known = new ArrayList<>(parameterIndex.keySet());
    known.addAll(operators.keySet());
    List<String> words = new ArrayList<>(known);
    words.addAll(Vocabulary.CONSTANTS);
    words.addAll(Vocabulary.FUNCTIONS);
    words.addAll(Vocabulary.LOCAL_OPERATORS);
    return "unknown name `"
        + name
        + "`"
        + Vocabulary.nearest(name, words)
        + "; parameters and operators above are "
        + Vocabulary.list(known);
  }
}
