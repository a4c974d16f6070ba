package org.hullsum.mesh;

import java.io.IOException;

/** Carries a fault, place and all, through a stream or channel to whoever reads from it. */
final class CarriedFault extends IOException {
  private static final long serialVersionUID = 1L;

  private final MeshFault fault;

  CarriedFault(MeshFault fault) {
    super(fault.getMessage(), fault);
    this.fault = fault;
  }

  MeshFault fault() {
    return fault;
  }
}
