package isowright.cli;

import isowright.report.FindingsJson;
import isowright.report.Publication;
import isowright.study.Findings;
import isowright.study.Mistake;
import isowright.study.PlanQuestion;
import isowright.study.StudyRefused;
import isowright.study.TechnologyFile;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Does the work of {@link Plan}; loaded only when it is asked for. */
final class PlanCommand {

  private static final String QUESTION = "least-cost[1].";

  private PlanCommand() {}

  /** Answers a question and prints the answer; writes only where a folder is named. */
  static ExitCode run(
      Path file,
      Optional<Path> question,
      Map<String, String> options,
      Optional<Path> into,
      boolean json,
      Main main)
      throws StudyRefused, Publication.Refused {
    if (question.isPresent() && !options.isEmpty()) {
      String given = "--" + String.join(", --", options.keySet());
      main.err()
          .println("isowright: the question stands in " + question.get() + "; take away " + given);
      return ExitCode.MISTAKE;
    }
    TechnologyFile technology = TechnologyFile.read(file);
    if (into.isEmpty()) {
      print(answer(technology, question, options), Optional.empty(), json, main);
      return ExitCode.DONE;
    }
    try (Publication publication = Publication.into(into.get())) {
      Findings findings = answer(technology, question, options);
      Map<String, byte[]> files = RunCommand.files(findings, List.of(), Optional::empty);
      files.remove("technology.json"); // it is what was asked, and lies where it lay
      publication.write(files);
      print(findings, Optional.of(publication.folder()), json, main);
    }
    return ExitCode.DONE;
  }

  private static void print(Findings findings, Optional<Path> folder, boolean json, Main main) {
    if (json) {
      main.out().print(new String(FindingsJson.write(findings), StandardCharsets.UTF_8));
    } else {
      new Answer(main.out()).print(findings, folder);
    }
  }

  private static Findings answer(
      TechnologyFile technology, Optional<Path> question, Map<String, String> options)
      throws StudyRefused {
    if (question.isPresent()) {
      return PlanQuestion.answer(technology, question.get());
    }
    try {
      return PlanQuestion.answer(technology, QuestionWords.of(options));
    } catch (StudyRefused refused) {
      throw new StudyRefused(
          Path.of("the question"), refused.mistakes().stream().map(PlanCommand::named).toList());
    }
  }

  /** A mistake of an option by the name of the option; there is no line. */
  private static Mistake named(Mistake mistake) {
    String key = mistake.key();
    String option = key.startsWith(QUESTION) ? "--" + key.substring(QUESTION.length()) : "";
    return new Mistake(0, 0, option, mistake.message());
  }
}
