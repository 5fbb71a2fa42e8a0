package nearworld.exchange.faults;

import nearworld.engine.basics.Fault;

/** A fault and where the text has it. */
public record LocatedFault(Fault fault, Place place) {}
