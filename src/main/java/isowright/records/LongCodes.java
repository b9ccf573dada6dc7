package isowright.records;

import java.util.Arrays;

/** Numbers whole numbers 0, 1, 2, … in the order in which they are first met. */
final class LongCodes {

  private long[] keys = new long[16];
  private int[] slots = new int[64];
  private int size;

  LongCodes() {
    Arrays.fill(slots, -1);
  }

  int size() {
    return size;
  }

  long key(int code) {
    return keys[code];
  }

  /** The code of a number, a new one where it was not met before. */
  int codeOf(long key) {
    int at = place(key, slots);
    if (slots[at] >= 0) {
      return slots[at];
    }
    if (size == keys.length) {
      keys = Arrays.copyOf(keys, 2 * size);
    }
    keys[size] = key;
    slots[at] = size++;
    if (4 * size > slots.length) {
      grow();
    }
    return size - 1;
  }

  private void grow() {
    int[] larger = new int[4 * slots.length];
    Arrays.fill(larger, -1);
    for (int code = 0; code < size; code++) {
      larger[place(keys[code], larger)] = code;
    }
    slots = larger;
  }

  private int place(long key, int[] in) {
    long mixed = key * 0x9E3779B97F4A7C15L;
    int at = (int) (mixed >>> 32) & (in.length - 1);
    while (in[at] >= 0 && keys[in[at]] != key) {
      at = (at + 1) & (in.length - 1);
    }
    return at;
  }
}
