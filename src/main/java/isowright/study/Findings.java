package isowright.study;

import isowright.study.FitFindings.Fitted;
import isowright.study.PlanFindings.Planned;
import isowright.study.PlanFindings.Reviewed;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Everything a study found: the one tree of results from which the report, the charts and the
 * findings file are made. Views only print what stands here; they compute nothing.
 *
 * <p>Immutable. Maps keep the order of the study (inputs in their order).
 *
 * @param run versions, hashes and settings of the run
 * @param units the units and the money that figures are printed with
 * @param confidence the level of all intervals, such as 0.95
 * @param records what the records are; absent where only given technologies were asked
 * @param fits the technologies fitted
 * @param given the technologies taken as known, with their elasticities and regularity at their
 *     base
 * @param plans the answers to the least-cost questions, question by question, technology by
 *     technology
 * @param reviews filed costs held against least cost
 * @param review what follows from the filed costs: orders, other choices, allowances
 * @param specification results beside what was laid down before fitting
 * @param costs what was found of the cost side
 * @param handover what it takes to ask the technologies without the records
 * @param remarks what must be said of the whole study
 */
public record Findings(
    Run run,
    Units units,
    double confidence,
    Optional<Records> records,
    List<Fitted> fits,
    List<FitFindings.Given> given,
    List<Planned> plans,
    List<Reviewed> reviews,
    ReviewFindings review,
    SpecificationFindings specification,
    CostFindings costs,
    Handover handover,
    List<Said> remarks) {

  /** Findings of which nothing is handed over. */
  public Findings(
      Run run,
      Units units,
      double confidence,
      Optional<Records> records,
      List<Fitted> fits,
      List<FitFindings.Given> given,
      List<Planned> plans,
      List<Reviewed> reviews,
      ReviewFindings review,
      SpecificationFindings specification,
      CostFindings costs,
      List<Said> remarks) {
    this(
        run,
        units,
        confidence,
        records,
        fits,
        given,
        plans,
        reviews,
        review,
        specification,
        costs,
        Handover.NONE,
        remarks);
  }

  /** Findings of a study that laid nothing down beforehand. */
  public Findings(
      Run run,
      Units units,
      double confidence,
      Optional<Records> records,
      List<Fitted> fits,
      List<FitFindings.Given> given,
      List<Planned> plans,
      List<Reviewed> reviews,
      List<Said> remarks) {
    this(
        run,
        units,
        confidence,
        records,
        fits,
        given,
        plans,
        reviews,
        ReviewFindings.NONE,
        SpecificationFindings.NONE,
        CostFindings.NONE,
        remarks);
  }

  /** Copies the lists. */
  public Findings {
    fits = List.copyOf(fits);
    given = List.copyOf(given);
    plans = List.copyOf(plans);
    reviews = List.copyOf(reviews);
    remarks = List.copyOf(remarks);
  }

  /**
   * A remark on a result.
   *
   * @param severity {@code error}, {@code warning} or {@code note}
   * @param code a short, stable name of the kind of remark
   * @param message the whole sentence
   * @param rows the first few rows of the file concerned, may be empty
   */
  public record Said(String severity, String code, String message, List<Integer> rows) {
    /** Copies the rows. */
    public Said {
      rows = List.copyOf(rows);
    }

    /** A remark that concerns no rows. */
    public static Said of(String severity, String code, String message) {
      return new Said(severity, code, message, List.of());
    }
  }

  /**
   * How the run was made.
   *
   * @param version the program's version
   * @param title the study's title
   * @param studyFile the study file's name
   * @param studySha256 its SHA-256
   * @param settings every setting in force, by key of the study file, defaults included
   */
  public record Run(
      String version,
      String title,
      String studyFile,
      String studySha256,
      Map<String, String> settings) {}

  /**
   * Units and money.
   *
   * @param output the unit of output, empty where not stated
   * @param inputs the unit by input, empty where not stated
   * @param money how money is printed, such as "EUR of 2020"
   */
  public record Units(String output, Map<String, String> inputs, String money) {}

  /**
   * The records.
   *
   * @param file the file's name
   * @param sha256 its SHA-256
   * @param rows the rows in the file
   * @param used the rows used
   * @param plants the number of plants
   * @param periods the number of periods
   * @param firstPeriod the first period, as written
   * @param lastPeriod the last period
   * @param facts how the file was read: encoding, delimiter, decimal mark, sheet, …; each
   *     recognised or declared
   * @param columns descriptive statistics of each column used
   * @param setAside rows not used, with reasons
   * @param remarks what the audit found
   */
  public record Records(
      String file,
      String sha256,
      int rows,
      int used,
      int plants,
      int periods,
      String firstPeriod,
      String lastPeriod,
      Map<String, String> facts,
      List<Described> columns,
      List<SetAside> setAside,
      List<Said> remarks) {
    /** Copies the lists. */
    public Records {
      columns = List.copyOf(columns);
      setAside = List.copyOf(setAside);
      remarks = List.copyOf(remarks);
    }
  }

  /**
   * A column described.
   *
   * @param column its heading
   * @param role what it is: output, quantity of labour, price of labour, …
   * @param unit its unit, empty where not stated
   * @param count values present
   * @param mean the mean
   * @param standardDeviation the standard deviation (divisor N − 1)
   * @param least the least value
   * @param most the greatest value
   * @param withinShare the share of the variance (of logs where all values are positive) that lies
   *     within plants; absent without repeated plants
   */
  public record Described(
      String column,
      String role,
      String unit,
      int count,
      double mean,
      double standardDeviation,
      double least,
      double most,
      Optional<Double> withinShare) {}

  /**
   * Rows not used.
   *
   * @param reason why
   * @param count how many
   * @param rows the first few, as in the file
   */
  public record SetAside(String reason, int count, List<Integer> rows) {
    /** Copies the rows. */
    public SetAside {
      rows = List.copyOf(rows);
    }
  }
}
