package org.hullsum.flux;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.hullsum.flux.Assemblies.Assembly;
import org.hullsum.numeric.Vector3;
import org.junit.jupiter.api.Test;

class JumpSearchTest {
  private static final Assembly CAN = Assemblies.can(1, 0, 2);

  private static Optional<FieldJump> find(Assembly assembly, String p, String q, String r) {
    return JumpSearch.find(
        VolumeIntegratorTest.boundary(assembly),
        TestFields.parse(List.of(p, q, r)),
        Map.of(),
        OptionalDouble.empty());
  }

  @Test
  void jumpAcrossAPlaneIsFoundWithItsSize() {
    FieldJump jump = find(CAN, "0", "0", "if(z > 0.7, 3, 1)").orElseThrow();
    assertEquals(0.7, jump.place().z(), 1e-9);
    assertEquals(2, jump.jump(), 1e-9);
    assertEquals(2, jump.normalJump(), 1e-6);
  }

  @Test
  void shearAlongAPlaneJumpsWithoutMakingFlux() {
    FieldJump jump = find(CAN, "sign(z - 0.7)", "0", "0").orElseThrow();
    assertEquals(2, jump.jump(), 1e-9);
    assertEquals(0, jump.normalJump(), 1e-6);
  }

  @Test
  void continuousSwitchIsNoJump() {
    assertEquals(Optional.empty(), find(CAN, "if(z > 0.7, z, 1.4 - z)", "abs(x)", "max(x, y)"));
  }

  @Test
  void jumpOutsideTheRegionDoesNotCount() {
    Assembly torus = Assemblies.torus(1, 0.3);
    String condition = "x^2 + y^2 + z^2 < 0.36";
    assertEquals(Optional.empty(), find(torus, "if(" + condition + ", 5, 1)", "0", "0"));
    assertEquals(
        true,
        find(Assemblies.ball(Vector3.ZERO, 1), "if(" + condition + ", 5, 1)", "0", "0")
            .isPresent());
  }

  @Test
  void angleJumpsOnItsCutAndItsCosineDoesNot() {
    FieldJump jump = find(CAN, "0", "atan2(y, x)", "0").orElseThrow();
    assertEquals(0, jump.place().y(), 1e-9);
    assertEquals(2 * Math.PI, jump.normalJump(), 1e-4);
    assertEquals(Optional.empty(), find(CAN, "cos(atan2(y, x))*(x^2+y^2)", "0", "0"));
  }
}
