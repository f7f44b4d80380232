package blochbound.casefile;

import blochbound.casefile.YamlNode.Entry;
import blochbound.casefile.YamlNode.Mapping;
import blochbound.model.HilbertSpace;
import blochbound.model.Site;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;

/** Reads the section {@code sites}. */
final class SiteReader {
  /** Most levels of one site, and of all sites together. */
  static final int MOST_LEVELS = 64;

  private static final String SHAPE = "a list of labels such as [g, e], or a number of levels";

  private final Scope scope;

  SiteReader(Scope scope) {
    this.scope = scope;
  }

  /** Reads all sites and tells them to the scope when none has a fault. */
  void read(YamlNode section) {
    Mapping mapping = section.asMapping("sites as a mapping, such as left: {levels: [g, e]}");
    if (mapping.entries().isEmpty()) {
      throw FaultSignal.of(mapping.fault("there is no site; a device needs at least one"));
    }
    List<Site> sites = new ArrayList<>();
    for (Entry e : mapping.entries()) {
      scope.claimSite(e.key());
      scope.log().attempt(() -> site(e)).ifPresent(sites::add);
    }
    if (sites.size() == mapping.entries().size()) {
      long levels = 1;
      for (Site s : sites) {
        levels = Math.min(Integer.MAX_VALUE, levels * s.dimension());
      }
      if (levels > MOST_LEVELS) {
        throw FaultSignal.of(
            mapping.fault(
                "the sites have "
                    + (levels < Integer.MAX_VALUE ? levels : "over 2147483646")
                    + " levels together; this version handles up to "
                    + MOST_LEVELS));
      }
      scope.setSites(new HilbertSpace(sites));
    }
  }

  private Site site(Entry entry) {
    if (entry.value().isNothing()) {
      throw FaultSignal.of(entry.key().fault("a site needs {levels: " + SHAPE + "}"));
    }
    Mapping mapping = entry.value().asMapping("a site as {levels: " + SHAPE + "}");
    Fields fields = new Fields(mapping, "a site", List.of("levels"), scope.log());
    YamlNode levels = fields.needed("levels");
    List<String> labels =
        levels instanceof YamlScalar count ? numbered(count) : labels(levels.asSequence(SHAPE));
    return new Site(entry.key().text(), labels);
  }

  private static List<String> numbered(YamlScalar count) {
    String text = count.text();
    if (!text.matches("\\d{1,9}")) {
      throw FaultSignal.of(count.fault("`" + text + "` is neither " + SHAPE));
    }
    int levels = Integer.parseInt(text);
    checkCount(levels, count);
    return IntStream.range(0, levels).mapToObj(Integer::toString).toList();
  }

  private static void checkCount(int levels, YamlNode at) {
    if (levels < 1 || levels > MOST_LEVELS) {
      throw FaultSignal.of(at.fault("a site has 1 to " + MOST_LEVELS + " levels, not " + levels));
    }
  }

  private List<String> labels(YamlNode.Sequence sequence) {
    checkCount(sequence.items().size(), sequence);
    List<String> labels = new ArrayList<>();
    Optional<Fault> fault = Optional.empty();
    for (YamlNode item : sequence.items()) {
      YamlScalar label = item.asScalar("a level label");
      if (!Vocabulary.isLabel(label.text())) {
        fault =
            Optional.of(
                label.fault(
                    "`"
                        + label.text()
                        + "` is no level label; labels hold letters, digits, _ + -, at most 64"));
      } else if (labels.contains(label.text())) {
        fault = Optional.of(label.fault("the level label `" + label.text() + "` occurs twice"));
      }
      fault.ifPresent(scope.log()::add);
      labels.add(label.text());
    }
    if (fault.isPresent()) {
      throw FaultSignal.following();
    }
    return labels;
  }
}
