package isowright.records;

import java.io.IOException;
import java.io.InterruptedIOException;
import java.io.Reader;
import java.util.concurrent.ArrayBlockingQueue;
import java.util.concurrent.BlockingQueue;

/**
 * Reads characters ahead on a second thread, so that the bytes of a large file are fetched, hashed
 * and decoded while those before are parsed. What goes wrong on that thread is thrown where it is
 * read.
 *
 * <p>The thread ends with the file, with the first failure, or when this is closed.
 */
final class ReadAhead extends Reader {

  private static final int CHUNK = 1 << 16;
  private static final int CHUNKS = 8;

  /** Characters, or the end, or a failure. */
  private record Chunk(
      char[] characters, int length, @org.jspecify.annotations.Nullable IOException failure) {}

  private final BlockingQueue<Chunk> queue = new ArrayBlockingQueue<>(CHUNKS);
  private final Thread thread;
  private Chunk current = new Chunk(new char[0], 0, null);
  private int at;

  /** Starts reading; the source is closed by its owner after this has been closed. */
  ReadAhead(Reader source) {
    thread = new Thread(() -> fetch(source), "read-ahead");
    thread.setDaemon(true);
    thread.start();
  }

  private void fetch(Reader source) {
    try {
      Chunk chunk;
      do {
        chunk = next(source);
        queue.put(chunk);
      } while (chunk.length >= 0);
    } catch (InterruptedException closed) {
      Thread.currentThread().interrupt();
    }
  }

  private static Chunk next(Reader source) {
    try {
      char[] characters = new char[CHUNK];
      int length = source.read(characters);
      return new Chunk(characters, length, null);
    } catch (IOException failure) {
      return new Chunk(new char[0], -1, failure);
    }
  }

  @Override
  public int read(char[] into, int offset, int length) throws IOException {
    while (at >= current.length) {
      if (current.failure != null) {
        throw current.failure;
      }
      if (current.length < 0) {
        return -1;
      }
      current = take();
      at = 0;
    }
    int count = Math.min(length, current.length - at);
    System.arraycopy(current.characters, at, into, offset, count);
    at += count;
    return count;
  }

  private Chunk take() throws InterruptedIOException {
    try {
      return queue.take();
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
      throw new InterruptedIOException("interrupted while reading");
    }
  }

  /** Stops the thread and waits until it has let go of the source. */
  @Override
  public void close() {
    thread.interrupt();
    queue.clear();
    try {
      thread.join();
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
    }
  }
}
