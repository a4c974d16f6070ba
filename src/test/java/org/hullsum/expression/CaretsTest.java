package org.hullsum.expression;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;

class CaretsTest {
  @Test
  void caretsStandUnderTheSpan() {
    assertEquals("x + raduis*y\n    ^^^^^^", Carets.render("x + raduis*y", 4, 10));
  }

  @Test
  void emptySpanAtTheEndHasOneCaret() {
    assertEquals("x +\n   ^", Carets.render("x +", 3, 3));
  }

  @Test
  void onlyTheLineOfTheSpanIsShown() {
    assertEquals("  y + q\n      ^", Carets.render("x +\n  y + q\n  + z", 10, 11));
  }

  @Test
  void longLineIsCutAroundTheSpan() {
    String text = "x".repeat(200) + "?" + "y".repeat(200);
    String[] lines = Carets.render(text, 200, 201).split("\n", -1);
    assertTrue(lines[0].length() <= 80, lines[0]);
    assertEquals('?', lines[0].charAt(lines[1].indexOf('^')));
    assertEquals(1, lines[1].trim().length());
  }

  @Test
  void characterOutsideTheBasicPlaneCountsOnce() {
    assertEquals("\ud835\udc65 + q\n    ^", Carets.render("\ud835\udc65 + q", 5, 6));
  }

  @Test
  void spanOutsideTheTextIsRefused() {
    assertThrows(IndexOutOfBoundsException.class, () -> Carets.render("x", 0, 2));
  }
}
