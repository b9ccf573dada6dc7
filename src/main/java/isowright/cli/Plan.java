package isowright.cli;

import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.concurrent.Callable;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.ParentCommand;

/** {@code plan}: answers a least-cost question without records, by {@link PlanCommand}. */
@Command(
    name = "plan",
    sortOptions = false,
    header = {"answer a least-cost question from a technology.json, without the records", ""},
    description = {
      "",
      "A run writes technology.json beside its report. It holds the technologies with their",
      "uncertainty, and where the records lie, but no row of them: it can be handed over when",
      "the records are confidential. The figures are those that run would find for the same",
      "question (intervals by propagation), and each answer says whether it lies inside the",
      "records. Ask with options, or with a file in the words of a study's least-cost."
    },
    synopsisHeading = "Use it so:%n",
    customSynopsis = {
      "  isowright plan TECHNOLOGY --target NUMBER [--prices INPUT=NUMBER,...] [more options]",
      "  isowright plan TECHNOLOGY --question FILE"
    },
    parameterListHeading = "%nWhat to give%n",
    optionListHeading = "%nOptions%n",
    footer = {
      "",
      "Examples",
      "  isowright plan technology.json --target 52000",
      "  isowright plan technology.json --technology ces --target 52000 \\",
      "      --prices labour=34,machines=74 --hold machines=21000 --limits labour=0..60000",
      "  isowright plan technology.json --budget 9000000 --productivity best-quarter --json",
      "  isowright plan technology.json --question next-year.yaml --into next-year",
      "",
      "A question file, with any word of a study's least-cost:",
      "  least-cost:",
      "    - name: Overtime",
      "      target: 52000",
      "      prices: {machines: 74}",
      "      price-bands: {labour: [{to: 40000, price: 34}, {price: 51}]}"
    })
final class Plan implements Callable<Integer> {

  @ParentCommand private @Nullable Main main;

  @Parameters(paramLabel = "TECHNOLOGY", description = "the technology.json that a run wrote")
  private @Nullable Path technology;

  @Option(
      names = "--question",
      paramLabel = "FILE",
      description = "a file with least-cost questions, in place of the options that follow")
  private @Nullable Path question;

  @Option(
      names = "--technology",
      paramLabel = "NAME,...",
      description = "which technologies answer; all if left out")
  private @Nullable String named;

  @Option(names = "--target", paramLabel = "NUMBER,...", description = "the output to be reached")
  private @Nullable String target;

  @Option(
      names = "--budget",
      paramLabel = "NUMBER",
      description = "in place of a target: the most output for this money")
  private @Nullable String budget;

  @Option(
      names = "--output-price",
      paramLabel = "NUMBER",
      description = "in place of a target: the most profit at this price of output")
  private @Nullable String outputPrice;

  @Option(
      names = "--prices",
      paramLabel = "INPUT=NUMBER,...",
      description = "one for every input; the records' last mean prices if left out")
  private @Nullable String prices;

  @Option(
      names = "--hold",
      paramLabel = "INPUT=NUMBER,...",
      description = "inputs that cannot change: the short run")
  private @Nullable String hold;

  @Option(
      names = "--limits",
      paramLabel = "INPUT=LEAST..MOST,...",
      description = "what can be had of an input; either end may be left out")
  private @Nullable String limits;

  @Option(
      names = "--take-at-least",
      paramLabel = "INPUT=NUMBER,...",
      description = "what is paid for whether used or not")
  private @Nullable String takeAtLeast;

  @Option(
      names = "--whole",
      paramLabel = "INPUT,...",
      description = "inputs that come in whole units")
  private @Nullable String whole;

  @Option(
      names = "--productivity",
      paramLabel = "WORDS",
      description = "typical, best-quarter or \"plant: NAME\"; typical if left out")
  private @Nullable String productivity;

  @Option(
      names = "--period",
      paramLabel = "PERIOD",
      description = "at which a change over time is taken; the last if left out")
  private @Nullable String period;

  @Option(
      names = "--into",
      paramLabel = "DIR",
      description = "write report.html, findings.json and charts/ into this folder")
  private @Nullable Path into;

  @Option(names = "--json", description = "print the findings as JSON in place of a table")
  private boolean json;

  @Option(
      names = {"-h", "--help"},
      usageHelp = true,
      description = "show this and end")
  @SuppressWarnings("unused") // the parser acts on it
  private boolean help;

  @Override
  public Integer call() throws Exception {
    Map<String, String> options = new LinkedHashMap<>();
    put(options, "technology", named);
    put(options, "target", target);
    put(options, "budget", budget);
    put(options, "output-price", outputPrice);
    put(options, "prices", prices);
    put(options, "hold", hold);
    put(options, "limits", limits);
    put(options, "take-at-least", takeAtLeast);
    put(options, "whole", whole);
    put(options, "productivity", productivity);
    put(options, "period", period);
    return PlanCommand.run(
            Objects.requireNonNull(technology),
            Optional.ofNullable(question),
            options,
            Optional.ofNullable(into),
            json,
            Objects.requireNonNull(main))
        .number();
  }

  private static void put(Map<String, String> options, String name, @Nullable String value) {
    if (value != null) {
      options.put(name, value);
    }
  }
}
