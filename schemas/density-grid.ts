/** The cells of the (energy, activity) plane in which points are counted at publication. */

/** Width of a cell along the energy axis, kT. */
export const ENERGY_CELL_KT = 0.1;
/** Height of a cell along the activity axis. */
export const ACTIVITY_CELL = 0.01;
