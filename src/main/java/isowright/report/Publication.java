package isowright.report;

import java.io.IOException;
import java.nio.file.AccessDeniedException;
import java.nio.file.AtomicMoveNotSupportedException;
import java.nio.file.FileAlreadyExistsException;
import java.nio.file.Files;
import java.nio.file.LinkOption;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import java.util.UUID;
import java.util.regex.Pattern;
import java.util.stream.Stream;

/**
 * Puts a report into its folder, whole or not at all.
 *
 * <p>Everything is written into a folder of another name beside the target first; then the two
 * change names. A run that fails at any point before leaves an earlier report exactly as it was,
 * and no half-written files. Files that someone laid beside an earlier report (notes, say) stay.
 *
 * <p>A folder is replaced only if it is empty or holds an earlier report, which is told by its
 * {@code findings.json}: no other folder is ever emptied. Names of files lie inside the folder by
 * their form, see {@link #write}.
 *
 * <p>While a publication is open, the folder is its own: a second one into the same folder is
 * refused, see {@link FolderClaim}. What a killed run left is mended by the next: an earlier report
 * that had already been moved aside comes back, half-written files go.
 *
 * <p>Tested in {@code PublicationTest}.
 */
public final class Publication implements AutoCloseable {

  /** The file by which a folder is known to hold a report. */
  public static final String MARK = "findings.json";

  /** The end of the names under which a run writes before it shows anything. */
  private static final Pattern OF_A_RUN = Pattern.compile("\\.(new|old)-[0-9a-f-]{36}$");

  private static final Pattern NAME = Pattern.compile("([a-z0-9][a-z0-9-]*/)?[a-z0-9][a-z0-9.-]*");

  private final Path folder;
  private final FolderClaim claim;

  private Publication(Path folder, FolderClaim claim) {
    this.folder = folder;
    this.claim = claim;
  }

  /** A report cannot be put where it was asked to go; the message says why and what to do. */
  public static final class Refused extends Exception {
    private static final long serialVersionUID = 1L;

    private Refused(String message) {
      super(message);
    }
  }

  /**
   * A publication into a folder, which need not exist. Nothing is written yet; what can be known to
   * fail is refused here, before a long run.
   *
   * @param folder the folder of the report
   */
  public static Publication into(Path folder) throws Refused {
    return into(folder, MARK);
  }

  /**
   * A publication of another kind than a report.
   *
   * @param folder the folder
   * @param mark the file by which a folder is known to hold an earlier one of this kind
   */
  public static Publication into(Path folder, String mark) throws Refused {
    Path target = folder.toAbsolutePath().normalize();
    if (target.getFileName() == null || target.getParent() == null) {
      throw new Refused(folder + " cannot be the folder of a report; name one inside it.");
    }
    try {
      if (Files.exists(target)) {
        target = target.toRealPath();
      }
      FolderClaim claim =
          FolderClaim.of(target)
              .orElseThrow(
                  () ->
                      new Refused(
                          "another run is writing into "
                              + folder
                              + " just now; wait until it is done, or name another folder."));
      try {
        return claimed(folder, target, mark, claim);
      } catch (IOException | Refused failed) {
        claim.close();
        throw failed;
      }
    } catch (IOException unreadable) {
      throw new Refused(
          folder + " cannot be used (" + words(unreadable) + "); choose another folder.");
    }
  }

  private static Publication claimed(Path folder, Path target, String mark, FolderClaim claim)
      throws IOException, Refused {
    mend(target);
    if (Files.exists(target)) {
      replaceable(folder, target, mark);
    }
    Path above = existing(Objects.requireNonNull(target.getParent()));
    if (!Files.isDirectory(above)) {
      throw new Refused(
          above + " is a file, so " + folder + " cannot be a folder; choose another folder.");
    }
    if (!Files.isWritable(above)) {
      throw new Refused(above + " cannot be written to; choose another folder for the report.");
    }
    return new Publication(target, claim);
  }

  /** Mends what a killed run left beside the folder; only its claimant may. */
  private static void mend(Path target) throws IOException {
    Path parent = Objects.requireNonNull(target.getParent());
    if (!Files.isDirectory(parent)) {
      return;
    }
    String name = "." + target.getFileName() + ".";
    List<Path> left;
    try (Stream<Path> entries = Files.list(parent)) {
      left =
          entries
              .filter(entry -> String.valueOf(entry.getFileName()).startsWith(name))
              .filter(entry -> OF_A_RUN.matcher(entry.toString()).find())
              .sorted()
              .toList();
    }
    for (Path entry : left) {
      boolean old = String.valueOf(entry.getFileName()).startsWith(name + "old-");
      if (old && !Files.exists(target)) {
        move(entry, target);
      } else if (!old) {
        removeQuietly(entry);
      }
    }
  }

  private static void replaceable(Path asked, Path target, String mark)
      throws IOException, Refused {
    if (!Files.isDirectory(target)) {
      throw new Refused(asked + " is a file; name a folder for the report.");
    }
    if (target.equals(Path.of("").toRealPath())) {
      throw new Refused(
          asked + " is the folder you work in, and a report replaces its folder; name another.");
    }
    if (!Files.exists(target.resolve(mark)) && !isEmpty(target)) {
      throw new Refused(
          asked
              + " holds other files and no earlier report (no "
              + mark
              + "), so it is left alone; name a new or an empty folder.");
    }
  }

  /** The folder of the report. */
  public Path folder() {
    return folder;
  }

  /** Gives the folder free for other runs. */
  @Override
  public void close() {
    claim.close();
  }

  /**
   * Puts the files in place, takes an earlier report away, and gives the folder free.
   *
   * @param files contents by name: lower-case letters, digits, points and hyphens, at most one
   *     folder deep, such as {@code charts/profile-ces.svg}
   * @throws Refused when the file system does not let it be done; everything is as it was then
   */
  public void write(Map<String, byte[]> files) throws Refused {
    for (String name : files.keySet()) {
      if (!NAME.matcher(name).matches() || name.contains("..")) {
        throw new IllegalArgumentException("not a name of a file of a report: " + name);
      }
    }
    Path parent = Objects.requireNonNull(folder.getParent());
    Path fresh = beside("new");
    Optional<Path> firstMade = firstMissing(parent);
    Thread whenEnded = new Thread(() -> removeQuietly(fresh), "half-written report");
    Runtime.getRuntime().addShutdownHook(whenEnded);
    try {
      Files.createDirectories(parent);
      Files.createDirectory(fresh);
      for (Map.Entry<String, byte[]> file : files.entrySet()) {
        Path path = fresh.resolve(file.getKey());
        Files.createDirectories(Objects.requireNonNull(path.getParent()));
        Files.write(path, file.getValue());
      }
      exchange(fresh, files.keySet());
    } catch (IOException failed) {
      removeQuietly(fresh);
      firstMade.ifPresent(topmost -> removeEmpty(parent, topmost));
      throw new Refused(
          "the report could not be written into "
              + folder
              + " ("
              + words(failed)
              + "); choose another folder.");
    } finally {
      forget(whenEnded);
      close();
    }
  }

  private static void forget(Thread whenEnded) {
    try {
      Runtime.getRuntime().removeShutdownHook(whenEnded);
    } catch (IllegalStateException ending) {
      return; // the process is being ended: the hook is at work already
    }
  }

  private void exchange(Path fresh, Set<String> names) throws IOException, Refused {
    if (!Files.exists(folder, LinkOption.NOFOLLOW_LINKS)) {
      move(fresh, folder);
      return;
    }
    Path old = beside("old");
    move(folder, old);
    try {
      move(fresh, folder);
    } catch (IOException failed) {
      move(old, folder);
      throw failed;
    }
    try {
      keepForeign(old, names);
    } catch (IOException stuck) {
      throw new Refused(
          "the report is in place, but other files of its folder could not be moved back into it ("
              + words(stuck)
              + "); they are in "
              + old
              + ".");
    }
    removeQuietly(old);
  }

  /** Moves what is not part of a report out of the earlier folder into the new one. */
  private void keepForeign(Path old, Set<String> names) throws IOException {
    Set<String> own = new TreeSet<>();
    names.forEach(name -> own.add(name.split("/", 2)[0]));
    List<Path> entries;
    try (Stream<Path> all = Files.list(old)) {
      entries = all.toList();
    }
    for (Path entry : entries) {
      String name = String.valueOf(entry.getFileName());
      if (!own.contains(name)) {
        move(entry, folder.resolve(name));
      }
    }
  }

  /** What the file system says, without the names of Java's exceptions. */
  private static String words(IOException failure) {
    if (failure instanceof AccessDeniedException denied) {
      return "no permission for " + denied.getFile();
    }
    return failure instanceof FileAlreadyExistsException there
        ? there.getFile() + " is in the way"
        : String.valueOf(failure.getMessage());
  }

  private Path beside(String what) {
    String name = "." + folder.getFileName() + "." + what + "-" + UUID.randomUUID();
    return folder.resolveSibling(name);
  }

  private static void move(Path from, Path to) throws IOException {
    try {
      Files.move(from, to, StandardCopyOption.ATOMIC_MOVE);
    } catch (AtomicMoveNotSupportedException elsewhere) {
      Files.move(from, to);
    }
  }

  private static boolean isEmpty(Path directory) throws IOException {
    try (Stream<Path> entries = Files.list(directory)) {
      return entries.findAny().isEmpty();
    }
  }

  /** The nearest folder, this one or above it, that exists. */
  private static Path existing(Path path) {
    Path at = path;
    while (!Files.exists(at) && at.getParent() != null) {
      at = at.getParent();
    }
    return at;
  }

  /** The topmost of the folders that have to be made, if any has. */
  private static Optional<Path> firstMissing(Path path) {
    Optional<Path> first = Optional.empty();
    for (Path at = path; at != null && !Files.exists(at); at = at.getParent()) {
      first = Optional.of(at);
    }
    return first;
  }

  /** Takes away folders made for a report that was not written, as far as they are empty. */
  private static void removeEmpty(Path from, Path topmost) {
    try {
      for (Path at = from; at != null && at.startsWith(topmost); at = at.getParent()) {
        if (Files.exists(at) && !isEmpty(at)) {
          return;
        }
        Files.deleteIfExists(at);
      }
    } catch (IOException left) {
      return; // an empty folder that cannot be taken away does no harm
    }
  }

  /** Removes a folder of our own making; what cannot be removed is left, out of the way. */
  private static void removeQuietly(Path directory) {
    if (!Files.exists(directory, LinkOption.NOFOLLOW_LINKS)) {
      return;
    }
    try (Stream<Path> all = Files.walk(directory)) {
      for (Path path : all.sorted(Comparator.reverseOrder()).toList()) {
        Files.deleteIfExists(path);
      }
    } catch (IOException left) {
      return;
    }
  }
}
