package isowright.study;

/** Being written. */
public final class StudyFile {
  private StudyFile() {}
}
