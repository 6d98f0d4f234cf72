package org.annulet.cases.read;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.Function;
import org.snakeyaml.engine.v2.api.LoadSettings;
import org.snakeyaml.engine.v2.api.lowlevel.Compose;
import org.snakeyaml.engine.v2.nodes.MappingNode;
import org.snakeyaml.engine.v2.nodes.Node;
import org.snakeyaml.engine.v2.nodes.NodeTuple;
import org.snakeyaml.engine.v2.nodes.ScalarNode;

/** Reads a case: all faults at once, or records in SI. */
public final class CaseReader {
  /** Name of the case file in a case folder. */
  public static final String FILE_NAME = "case.yaml";

  private static final int FORMAT = 1;

  private final Path path;
  private final String shown;
  private final DataFiles dataFiles = new DataFiles();

  private CaseReader(Path path, String shown) {
    this.path = path;
    this.shown = shown;
  }

  /**
   * Reads a case.
   *
   * @param folderOrFile a case file, or a folder that holds one called {@value #FILE_NAME}
   * @return the case or its faults; never throws for what the user wrote
   */
  public static Reading read(Path folderOrFile) {
    return read(folderOrFile, Map.of());
  }

  /**
   * Reads a case with some values replaced, as a sweep does.
   *
   * @param folderOrFile as in {@link #read(Path)}
   * @param changes new text by key path, as in {@code flames.main.response.delay} → {@code 2.1 ms}
   * @return the changed case or its faults; it keeps no variants when there are changes
   */
  public static Reading read(Path folderOrFile, Map<String, String> changes) {
    Path file = Files.isDirectory(folderOrFile) ? folderOrFile.resolve(FILE_NAME) : folderOrFile;
    String shown = file.getFileName() == null ? file.toString() : file.getFileName().toString();
    if (!Files.isRegularFile(file)) {
      boolean folder = Files.isDirectory(folderOrFile);
      return failed(
          new Problem(
              folderOrFile.toString(),
              0,
              0,
              "",
              folder ? "the folder holds no file '" + FILE_NAME + "'" : "no such file or folder",
              folder ? "name the case file itself, or rename it" : "check the path"));
    }
    return new CaseReader(file, shown).readFile(changes);
  }

  private static Reading failed(Problem problem) {
    return new Reading(Optional.empty(), List.of(problem), List.of());
  }

  private Binder binder() {
    return new Binder(shown, path.toAbsolutePath().normalize().getParent(), dataFiles);
  }

  private Reading readFile(Map<String, String> changes) {
    Binder binder = binder();
    Optional<Node> root = YamlTree.load(path, binder);
    if (root.isEmpty()) {
      return new Reading(Optional.empty(), binder.problems(), List.of());
    }
    if (changes.isEmpty()) {
      return bind(root.get(), binder);
    }
    return changed(root.get(), changes, binder);
  }

  private Reading changed(Node root, Map<String, String> changes, Binder binder) {
    Node tree = without(root, "variants");
    for (Map.Entry<String, String> change : changes.entrySet()) {
      Optional<Node> value =
          new Compose(LoadSettings.builder().setLabel(shown).build())
              .composeString(change.getValue());
      if (value.isPresent()) {
        Entry at = new Entry(change.getKey(), value.get(), binder);
        tree = TreeChange.replaced(tree, change.getKey(), at);
      }
    }
    return bind(tree, binder);
  }

  /** A tree without one key of its root. */
  private static Node without(Node root, String key) {
    if (!(root instanceof MappingNode map)) {
      return root;
    }
    List<NodeTuple> kept =
        map.getValue().stream()
            .filter(t -> !(t.getKeyNode() instanceof ScalarNode k && k.getValue().equals(key)))
            .toList();
    return new MappingNode(
        map.getTag(), true, kept, map.getFlowStyle(), map.getStartMark(), map.getEndMark());
  }

  private Reading bind(Node root, Binder binder) {
    Mapping m = Mapping.of(new Entry("", root, binder), CaseKeys.CASE);
    m.get("annulet").ifPresent(CaseReader::format);
    String title = m.get("title").flatMap(Entry::text).orElse("");
    String about = m.get("about").flatMap(Entry::text).orElse("");
    Optional<Geometry> geometry = m.get("geometry").flatMap(GeometryReader::read);
    Geometry shape = geometry.orElse(null);
    if (binder.clean()) { // a geometry with faults of its own is not drawn
      geometry
          .flatMap(DrawnShape::check)
          .ifPresent(f -> DrawnShape.problems(binder.source(), f).forEach(binder::add));
    }
    // Without a geometry no name can be checked; values still can.
    EdgeNames names = geometry.map(EdgeNames::of).orElse(new EdgeNames(List.of(), Map.of()));
    Gas gas =
        m.get("gas").map(e -> GasReader.read(e, geometry)).orElse(new Gas(Double.NaN, Map.of()));
    Map<String, Wall> walls = m.get("walls").map(e -> WallReader.read(e, names)).orElse(Map.of());
    List<TwoPort> twoPorts =
        geometry.isPresent()
            ? m.get("two_ports").map(new TwoPortReader(shape)::read).orElse(List.of())
            : List.of();
    List<Damper> dampers =
        geometry.isPresent()
            ? m.get("dampers").map(new DamperReader(shape)::read).orElse(List.of())
            : List.of();
    List<Flame> flames =
        geometry.isPresent()
            ? m.get("flames").map(new FlameReader(shape)::read).orElse(List.of())
            : List.of();
    if (!flames.isEmpty()
        && twoPorts.isEmpty()
        && dampers.isEmpty()
        && walls.values().stream().noneMatch(Wall::takesEnergy)) {
      m.at("flames")
          .caution(
              "flames, and no loss anywhere: every mode the flames drive will grow",
              "give the burners their pressure loss under 'two_ports', and the ends their impedance");
    }
    Optional<WindowReader> window = m.get("window").map(e -> WindowReader.read(e, shape));
    Studies studies =
        geometry.isPresent()
            ? m.get("studies")
                .map(
                    new StudiesReader(
                            shape, dampers, flames.stream().map(Flame::name).toList(), window)
                        ::read)
                .orElse(Studies.NONE)
            : Studies.NONE;
    CaseFile.Outputs outputs =
        m.get("outputs").map(new OutputsReader(names)::read).orElse(CaseFile.Outputs.everything());
    boolean clean = binder.clean();
    Set<Problem> problems = new LinkedHashSet<>(binder.problems());
    Set<Problem> cautions = new LinkedHashSet<>(binder.cautions());
    Function<List<CaseFile.Variant>, CaseFile> build =
        variants ->
            new CaseFile(
                path,
                title,
                about,
                shape,
                gas,
                walls,
                twoPorts,
                dampers,
                flames,
                window.orElseThrow().window(),
                window.orElseThrow().orders(),
                studies,
                outputs,
                variants,
                binder.source(changes -> changed(root, changes, binder())));
    List<CaseFile.Variant> variants =
        m.get("variants").map(e -> variants(e, root, problems, cautions)).orElse(List.of());
    return problems.isEmpty() && clean
        ? new Reading(Optional.of(build.apply(variants)), List.of(), sorted(cautions))
        : new Reading(Optional.empty(), sorted(problems), sorted(cautions));
  }

  private static List<Problem> sorted(Set<Problem> problems) {
    Binder b = new Binder("", null);
    problems.forEach(b::add);
    return b.problems();
  }

  private static void format(Entry e) {
    if (!e.text().equals(Optional.of(String.valueOf(FORMAT)))) {
      e.fault(
          "format " + e.shown() + " of case files is not known to this version",
          "write 'annulet: " + FORMAT + "'");
    }
  }

  private List<CaseFile.Variant> variants(
      Entry entry, Node root, Set<Problem> problems, Set<Problem> cautions) {
    List<CaseFile.Variant> variants = new ArrayList<>();
    Set<String> names = new LinkedHashSet<>();
    for (Entry item : entry.items()) {
      Mapping m = Mapping.of(item, CaseKeys.VARIANT);
      String name = m.get("name").flatMap(Entry::text).orElse("");
      m.get("name").filter(e -> !name.isEmpty()).ifPresent(e -> Mapping.checkName(e, name));
      if (!name.isEmpty() && !names.add(name)) {
        item.fault("two variants are called '" + name + "'", "rename one of them");
      }
      String about = m.get("about").flatMap(Entry::text).orElse("");
      Binder binder = binder();
      Node tree = without(root, "variants");
      Map<String, Entry> set =
          m.get("set").map(e -> Mapping.named(e).entries()).orElse(new LinkedHashMap<>());
      for (Map.Entry<String, Entry> change : set.entrySet()) {
        Entry at = new Entry(change.getValue().key(), change.getValue().node(), binder);
        tree = TreeChange.replaced(tree, change.getKey(), at);
      }
      Reading changed = bind(tree, binder);
      problems.addAll(changed.problems());
      cautions.addAll(changed.cautions());
      changed.caseFile().ifPresent(c -> variants.add(new CaseFile.Variant(name, about, c)));
    }
    problems.addAll(entry.binder().problems());
    return List.copyOf(variants);
  }
}
