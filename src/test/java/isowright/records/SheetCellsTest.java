package isowright.records;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;

/** Letters of a workbook's columns and their numbers. */
class SheetCellsTest {

  @Test
  void lettersOfColumns() {
    assertThat(SheetCells.column("A1")).isZero();
    assertThat(SheetCells.column("Z99")).isEqualTo(25);
    assertThat(SheetCells.column("AA1")).isEqualTo(26);
    assertThat(SheetCells.column("XFD1048576")).isEqualTo(16383);
    for (int column : new int[] {0, 25, 26, 701, 702, 16383}) {
      assertThat(SheetCells.column(Headings.columnLetters(column) + "7")).isEqualTo(column);
    }
  }
}
