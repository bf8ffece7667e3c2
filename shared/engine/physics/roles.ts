/** What a quantity can stand for. The unit fixes its dimension. */
export interface RoleRow {
  id: string;
  name: string;
  /** Coherent unit that fixes the dimension; empty for a plain number. */
  unit: string;
  description: string;
}

const row = (id: string, name: string, unit: string, description: string): RoleRow => ({
  id,
  name,
  unit,
  description,
});

/** Every role, in the order in which the list is shown. Laws and limits speak of quantities by these ids. */
export const ROLES_OF_QUANTITIES: readonly RoleRow[] = [
  row(
    'acceleratingPd',
    'accelerating p.d.',
    'V',
    'between cathode and anode, through which a particle gains its energy',
  ),
  row('platePd', 'p.d. between plates', 'V', 'between deflecting or parallel plates'),
  row('balancePd', 'balance p.d.', 'V', 'that holds a charged drop at rest between plates'),
  row('stoppingPd', 'stopping p.d.', 'V', 'that just stops the fastest electrons'),
  row('tubePd', 'X-ray tube p.d.', 'V', 'through which electrons reach the target'),
  row('plateSeparation', 'plate separation', 'm', 'distance between two plates'),
  row('plateLength', 'plate length', 'm', 'length of the field along the beam'),
  row('gap', 'gap', 'm', 'distance between cathode and anode'),
  row('fieldStrength', 'electric field strength', 'V m^-1', 'of a uniform field'),
  row('fluxDensity', 'magnetic flux density', 'T', 'of a uniform field at right angles to the motion'),
  row('speed', 'speed', 'm s^-1', 'of the particle'),
  row('acceleration', 'acceleration', 'm s^-2', 'of the particle'),
  row('force', 'force', 'N', 'electric or magnetic force on the particle'),
  row('momentum', 'momentum', 'kg m s^-1', 'of the particle'),
  row('kineticEnergy', 'kinetic energy', 'J', 'of the particle'),
  row('orbitRadius', 'radius of path', 'm', 'of a circular path in a magnetic field'),
  row('orbitPeriod', 'period of path', 's', 'time for a whole circle'),
  row('cyclotronFrequency', 'frequency of path', 'Hz', 'circles each second'),
  row('specificCharge', 'specific charge', 'C kg^-1', 'charge over mass of the particle'),
  row('transitTime', 'transit time', 's', 'spent between the plates'),
  row('deflection', 'deflection', 'm', 'sideways displacement at the end of the plates'),
  row(
    'exitSpeedAcross',
    'speed across',
    'm s^-1',
    'component at right angles to the entry, on leaving the plates',
  ),
  row('particleMass', 'mass of particle', 'kg', 'when it is not one of the constants'),
  row('particleCharge', 'charge of particle', 'C', 'when it is not e'),
  row('dropRadius', 'radius of drop', 'm', 'of a spherical drop'),
  row('dropDiameter', 'diameter of drop', 'm', 'of a spherical drop'),
  row('dropMass', 'mass of drop', 'kg', 'of a spherical drop'),
  row('dropDensity', 'density of liquid', 'kg m^-3', 'of the drop'),
  row('airDensity', 'density of the fluid', 'kg m^-3', 'air or liquid round the drop'),
  row('weight', 'weight', 'N', 'of the drop'),
  row('viscosity', 'viscosity', 'Pa s', 'of the air or liquid'),
  row('terminalSpeed', 'terminal speed', 'm s^-1', 'of a drop or ball that falls steadily'),
  row('drag', 'drag', 'N', 'viscous force on the drop'),
  row('charge', 'charge', 'C', 'on a drop'),
  row('chargeNumber', 'number of charges', '', 'how many elementary charges'),
  row('wavelength', 'wavelength', 'm', 'of radiation'),
  row('frequency', 'frequency', 'Hz', 'of radiation'),
  row('photonEnergy', 'photon energy', 'J', 'of one photon'),
  row('workFunction', 'work function', 'J', 'least energy that frees an electron from a surface'),
  row('greatestKineticEnergy', 'greatest kinetic energy', 'J', 'of photoelectrons'),
  row('thresholdFrequency', 'threshold frequency', 'Hz', 'below which no electron is freed'),
  row('thresholdWavelength', 'threshold wavelength', 'm', 'above which no electron is freed'),
  row('power', 'radiant power', 'W', 'of a source or beam'),
  row('photonRate', 'photon rate', 's^-1', 'photons each second'),
  row('photocurrent', 'photocurrent', 'A', 'through the cell'),
  row('electronRate', 'electron rate', 's^-1', 'electrons each second'),
  row('upperLevel', 'upper energy level', 'J', 'of an atom; negative when bound'),
  row('lowerLevel', 'lower energy level', 'J', 'of an atom; negative when bound'),
  row('levelNumber', 'number of level', '', 'whole number n of a hydrogen level'),
  row('deBroglieWavelength', 'de Broglie wavelength', 'm', 'of the particle'),
  row('planeSpacing', 'spacing of planes', 'm', 'of atoms in a crystal'),
  row('slitSeparation', 'slit separation', 'm', 'between slits or grating lines'),
  row('diffractionAngle', 'diffraction angle', 'rad', 'from the straight-through direction'),
  row('glancingAngle', 'glancing angle', 'rad', 'between beam and planes'),
  row('diffractionOrder', 'order', '', 'whole number of the maximum'),
  row('ringDiameter', 'ring diameter', 'm', 'on the screen'),
  row('ringRadius', 'ring radius', 'm', 'on the screen'),
  row('screenDistance', 'distance to screen', 'm', 'from crystal or slits'),
  row('temperature', 'temperature', 'K', 'absolute'),
];

const byId = new Map(ROLES_OF_QUANTITIES.map((role) => [role.id, role]));

/** The row of a role id, or undefined. */
export function findRole(id: string): RoleRow | undefined {
  return byId.get(id);
}
