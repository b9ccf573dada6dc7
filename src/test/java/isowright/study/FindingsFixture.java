package isowright.study;

import isowright.study.Findings.Described;
import isowright.study.Findings.Records;
import isowright.study.Findings.Run;
import isowright.study.Findings.Said;
import isowright.study.Findings.SetAside;
import isowright.study.Findings.Units;
import isowright.study.FitFindings.Given;
import isowright.study.FitFindings.Pair;
import isowright.study.PlanFindings.Planned;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Findings of an invented study of glassworks, for tests of views. The numbers are invented, but
 * hang together: least costs are those of the closed form, shares sum to one, parts of a gap add
 * up.
 */
public final class FindingsFixture {

  /** A plant's name that a careless view would turn into markup. */
  public static final String MARKUP = "<b>Glas & \"Söhne\"</b> <script>alert('x')</script>";

  /** The target of the first question. */
  public static final double TARGET = 52000;

  private FindingsFixture() {}

  /** Three fits, two questions, reviews; every status of a plan occurs. */
  public static Findings glassworks() {
    return glassworks("GW-03", "Glassworks, review of the 2024 cost filing");
  }

  /** The same with markup in the title and in a plant's name. */
  public static Findings withMarkup() {
    return glassworks(MARKUP, "Glassworks </title> & <i>others</i>");
  }

  private static Findings glassworks(String third, String title) {
    GlassworksPlants plants = new GlassworksPlants(third);
    List<Planned> plans = new ArrayList<>();
    for (String technology : List.of("cobb-douglas", "ces", "translog")) {
      plans.add(GlassworksPlans.solved("Plan 2025", technology, TARGET, "solved", plants));
    }
    plans.add(GlassworksPlans.solved("Large furnace", "cobb-douglas", 78000, "corner", plants));
    plans.add(GlassworksPlans.solved("Large furnace", "ces", 78000, "outside-records", plants));
    plans.add(GlassworksPlans.unanswered("Large furnace", "translog", 78000, "irregular", plants));
    plans.add(
        GlassworksPlans.unanswered("All of it", "cobb-douglas", 400000, "infeasible", plants));
    return new Findings(
        run(title),
        units("EUR of 2020"),
        0.95,
        Optional.of(records(plants)),
        List.of(
            GlassworksFits.cobbDouglas(plants),
            GlassworksFits.ces(plants),
            GlassworksFits.translog(plants)),
        List.of(),
        plans,
        GlassworksPlans.reviews("ces", plants),
        List.of(
            Said.of(
                "note",
                "forms-agree",
                "The three technologies give least costs within 3 % of one another.")));
  }

  /** Fits that failed: CES at the boundary, a translog that is rank deficient; no plan answered. */
  public static Findings troubled() {
    GlassworksPlants plants = new GlassworksPlants("GW-03");
    return new Findings(
        run("Glassworks, thin records"),
        units("EUR"),
        0.9,
        Optional.of(records(plants)),
        List.of(
            GlassworksFits.cobbDouglas(plants),
            GlassworksFits.cesAtBoundary(plants),
            GlassworksFits.translogRankDeficient(plants)),
        List.of(),
        List.of(
            GlassworksPlans.unanswered("All of it", "cobb-douglas", 400000, "infeasible", plants)),
        List.of(),
        List.of(
            Said.of("warning", "few-plants", "There are 20 plants; intervals may be too narrow.")));
  }

  /** Given technologies only: no records, no uncertainty, no currency. */
  public static Findings givenOnly() {
    Map<String, Double> parameters = new LinkedHashMap<>();
    parameters.put("constant", Math.log(GlassworksPlants.CONSTANT));
    parameters.putAll(elasticities());
    Given given =
        new Given(
            "filed",
            "cobb-douglas",
            parameters,
            elasticities(),
            1.04,
            List.of(new Pair("labour", "machines", "hicks", Figure.exact(1))),
            List.of());
    return new Findings(
        run("A technology as filed"),
        units("money"),
        0.95,
        Optional.empty(),
        List.of(),
        List.of(given),
        List.of(GlassworksPlans.known("Plan 2025", "filed", TARGET)),
        List.of(),
        List.of());
  }

  private static Map<String, Double> elasticities() {
    return GlassworksPlans.byInput(
        GlassworksPlants.LABOUR, GlassworksPlants.MACHINES, GlassworksPlants.ENERGY);
  }

  private static Run run(String title) {
    Map<String, String> settings = new LinkedHashMap<>();
    settings.put("estimation.plant-effects", "none");
    settings.put("estimation.time", "trend");
    settings.put("estimation.standard-errors", "clustered");
    settings.put("estimation.confidence", "0.95");
    return new Run("0.1.0", title, "glassworks.yaml", "3f".repeat(32), settings);
  }

  private static Units units(String money) {
    Map<String, String> inputs = new LinkedHashMap<>();
    inputs.put("labour", "h");
    inputs.put("machines", "h");
    inputs.put("energy", "GJ");
    return new Units("t", inputs, money);
  }

  private static Records records(GlassworksPlants plants) {
    Map<String, String> facts = new LinkedHashMap<>();
    facts.put("encoding", "UTF-8 (recognised)");
    facts.put("delimiter", "; (recognised)");
    facts.put("decimal mark", ". (declared)");
    List<Described> columns =
        List.of(
            described("tonnes", "output", "t", plants, 0.041),
            described("labour_hours", "quantity of labour", "h", plants, 0.052),
            described("machine_hours", "quantity of machines", "h", plants, 0.049),
            described("energy", "quantity of energy", "GJ", plants, 0.113));
    return new Records(
        "glassworks.csv",
        "a7".repeat(32),
        123,
        120,
        20,
        6,
        "2019",
        "2024",
        facts,
        columns,
        List.of(
            new SetAside("output is not positive", 2, List.of(44, 97)),
            new SetAside("quantity of energy is missing", 1, List.of(101))),
        List.of(
            new Said(
                "warning",
                "jump",
                "glassworks.csv, row 64, column machine_hours: 141,000 is ten times the plant's own"
                    + " history; check the decimal mark.",
                List.of(64))));
  }

  private static Described described(
      String column, String role, String unit, GlassworksPlants plants, double within) {
    double[] values =
        plants.rows().stream()
            .mapToDouble(
                r ->
                    switch (column) {
                      case "tonnes" -> r.output();
                      case "labour_hours" -> r.labour();
                      case "machine_hours" -> r.machines();
                      default -> r.energy();
                    })
            .toArray();
    double sum = 0;
    double least = Double.POSITIVE_INFINITY;
    double most = 0;
    for (double v : values) {
      sum += v;
      least = Math.min(least, v);
      most = Math.max(most, v);
    }
    double mean = sum / values.length;
    double squares = 0;
    for (double v : values) {
      squares += (v - mean) * (v - mean);
    }
    return new Described(
        column,
        role,
        unit,
        values.length,
        mean,
        Math.sqrt(squares / (values.length - 1)),
        least,
        most,
        Optional.of(within));
  }
}
