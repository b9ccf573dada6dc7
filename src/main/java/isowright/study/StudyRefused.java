package isowright.study;

import java.nio.file.Path;
import java.util.List;

/** A study file cannot be used; carries every mistake, not only the first. */
public final class StudyRefused extends Exception {

  private static final long serialVersionUID = 1L;

  private final transient Path file;
  private final transient List<Mistake> mistakes;

  /** With the mistakes, at least one, in the order of the file. */
  public StudyRefused(Path file, List<Mistake> mistakes) {
    super(mistakes.get(0).message());
    this.file = file;
    this.mistakes = List.copyOf(mistakes);
  }

  /** The study file. */
  public Path file() {
    return file;
  }

  /** Every mistake, in the order of the file. */
  public List<Mistake> mistakes() {
    return mistakes;
  }
}
