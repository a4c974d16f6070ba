package org.hullsum.units;

/** Which units may be written at a place. */
enum UnitRule {
  ANY {
    @Override
    boolean allows(Unit unit) {
      return true;
    }
  },
  /** In a case without units: angles only. */
  ANGLES {
    @Override
    boolean allows(Unit unit) {
      return unit.code().equals("deg") || unit.code().equals("rad");
    }
  },
  /** In a case without units, after a ±: angles, and parts of the value. */
  ANGLES_AND_RATIOS {
    @Override
    boolean allows(Unit unit) {
      return ANGLES.allows(unit) || unit.isRatio();
    }
  };

  abstract boolean allows(Unit unit);

  /** The rule for values of a case. */
  static UnitRule ofValues(WorkingUnits working) {
    return working.none() ? ANGLES : ANY;
  }

  /** The rule for the uncertainties of a case. */
  static UnitRule ofUncertainties(WorkingUnits working) {
    return working.none() ? ANGLES_AND_RATIOS : ANY;
  }
}
