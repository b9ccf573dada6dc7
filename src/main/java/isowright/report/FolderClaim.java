package isowright.report;

import java.io.IOException;
import java.nio.channels.FileChannel;
import java.nio.channels.FileLock;
import java.nio.channels.OverlappingFileLockException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.Optional;
import java.util.UUID;

/**
 * The claim of one run on the folder that it is going to write: while it is held, no other run of
 * this machine gets one on the same folder.
 *
 * <p>A lock of the operating system on a file in the folder for temporary files, named after the
 * user and the target: it needs no folder that does not exist yet, leaves nothing beside the
 * report, and ends with the process, however that ends. The empty file stays: were it taken away,
 * two later runs could each hold a lock on a file of that name.
 */
final class FolderClaim implements AutoCloseable {

  private final FileChannel channel;
  private final FileLock lock;

  private FolderClaim(FileChannel channel, FileLock lock) {
    this.channel = channel;
    this.lock = lock;
  }

  /** The claim on a folder; none where another run holds it. */
  static Optional<FolderClaim> of(Path target) throws IOException {
    String whose = System.getProperty("user.name", "") + "\0" + target;
    String name = UUID.nameUUIDFromBytes(whose.getBytes(StandardCharsets.UTF_8)).toString();
    Path file =
        Path.of(System.getProperty("java.io.tmpdir", ".")).resolve("isowright-" + name + ".lock");
    FileChannel channel =
        FileChannel.open(file, StandardOpenOption.CREATE, StandardOpenOption.WRITE);
    try {
      FileLock lock = channel.tryLock();
      if (lock != null) {
        return Optional.of(new FolderClaim(channel, lock));
      }
    } catch (OverlappingFileLockException heldHere) {
      channel.close();
      return Optional.empty();
    } catch (IOException failed) {
      channel.close();
      throw failed;
    }
    channel.close();
    return Optional.empty();
  }

  @Override
  public void close() {
    try {
      if (channel.isOpen()) {
        lock.release();
      }
      channel.close();
    } catch (IOException gone) {
      return; // the lock ends with the process at the latest
    }
  }
}
