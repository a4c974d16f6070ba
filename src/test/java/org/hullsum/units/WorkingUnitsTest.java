package org.hullsum.units;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.hullsum.problem.TextFault;
import org.junit.jupiter.api.Test;

class WorkingUnitsTest {
  private static Unit unit(String code) throws TextFault {
    return UnitParser.parse(code);
  }

  @Test
  void quantityIsConvertedToWorkingUnits() throws TextFault {
    WorkingUnits plant = WorkingUnits.of(unit("mm"), unit("h"), unit("t"), unit("K"));
    assertEquals(2e9, QuantityParser.parse("2 m3/h").in(plant), 1e-5);
    assertEquals(3.6, QuantityParser.parse("1 kg/s").in(plant), 1e-15);
    assertEquals(293.15, QuantityParser.parse("20 degC").in(plant), 1e-12);
    assertEquals(7, QuantityParser.parse("7").in(plant));
    Dimension flow = unit("m3/s").dimension();
    assertEquals(1, plant.toSi(plant.fromSi(1, flow), flow), 1e-15);
  }

  @Test
  void unitOfAnotherDimensionOrWithAnOffsetIsRefused() throws TextFault {
    Unit metre = unit("m");
    Unit second = unit("s");
    Unit kilogram = unit("kg");
    Unit celsius = unit("degC");
    assertThrows(
        IllegalArgumentException.class, () -> WorkingUnits.of(second, metre, kilogram, unit("K")));
    assertThrows(
        IllegalArgumentException.class, () -> WorkingUnits.of(metre, second, kilogram, celsius));
    assertFalse(WorkingUnits.fits(celsius, Dimension.TEMPERATURE));
    assertTrue(WorkingUnits.fits(celsius.difference(), Dimension.TEMPERATURE));
  }

  @Test
  void sizeThatIsNoSizeIsRefused() {
    assertThrows(IllegalArgumentException.class, () -> new WorkingUnits(0, 1, 1, 1, false));
  }
}
