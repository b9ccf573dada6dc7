package isowright.records;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;

/**
 * Numbers texts 0, 1, 2, … in the order in which they are first met. A text is looked up by its
 * characters, so that a million rows of fifty thousand plants make fifty thousand strings.
 */
final class TextCodes {

  private final List<String> texts = new ArrayList<>();
  private int[] hashes = new int[16];
  private int[] slots = new int[64];

  TextCodes() {
    Arrays.fill(slots, -1);
  }

  int size() {
    return texts.size();
  }

  String text(int code) {
    return texts.get(code);
  }

  List<String> texts() {
    return Collections.unmodifiableList(texts);
  }

  /** The code of a text, a new one where it was not met before. */
  int codeOf(char[] characters, int from, int length) {
    int hash = 0;
    for (int i = from; i < from + length; i++) {
      hash = 31 * hash + characters[i];
    }
    int at = spread(hash);
    while (slots[at] >= 0) {
      int code = slots[at];
      if (hashes[code] == hash && same(texts.get(code), characters, from, length)) {
        return code;
      }
      at = (at + 1) & (slots.length - 1);
    }
    return add(new String(characters, from, length), hash, at);
  }

  int codeOf(String text) {
    return codeOf(text.toCharArray(), 0, text.length());
  }

  private int add(String text, int hash, int at) {
    int code = texts.size();
    texts.add(text);
    if (code == hashes.length) {
      hashes = Arrays.copyOf(hashes, 2 * code);
    }
    hashes[code] = hash;
    slots[at] = code;
    if (4 * texts.size() > slots.length) {
      grow();
    }
    return code;
  }

  private void grow() {
    slots = new int[4 * slots.length];
    Arrays.fill(slots, -1);
    for (int code = 0; code < texts.size(); code++) {
      int at = spread(hashes[code]);
      while (slots[at] >= 0) {
        at = (at + 1) & (slots.length - 1);
      }
      slots[at] = code;
    }
  }

  private int spread(int hash) {
    int mixed = hash * 0x9E3779B9;
    return (mixed ^ (mixed >>> 15)) & (slots.length - 1);
  }

  private static boolean same(String text, char[] characters, int from, int length) {
    if (text.length() != length) {
      return false;
    }
    for (int i = 0; i < length; i++) {
      if (text.charAt(i) != characters[from + i]) {
        return false;
      }
    }
    return true;
  }
}
