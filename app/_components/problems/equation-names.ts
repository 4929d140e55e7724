import type { Equation } from '@/lib/domain/problems/schema';

/** Equations as people call them. */
export const equationNames: Record<Equation, string> = {
  none: 'none stated', poisson: 'Poisson', heat: 'heat conduction', heat_nonlinear: 'heat conduction, conductivity of temperature',
  advection_diffusion_reaction: 'advection, diffusion and reaction', burgers: 'Burgers', wave: 'wave', helmholtz: 'Helmholtz',
  incompressible_navier_stokes: 'Navier–Stokes, incompressible', compressible_euler: 'Euler, compressible',
  compressible_navier_stokes: 'Navier–Stokes, compressible', linear_elasticity: 'linear elasticity', custom: 'an equation of your own',
};

/** Those that can be chosen now. */
export const choosableEquations = (Object.keys(equationNames) as Equation[]).filter((equation) => equation !== 'custom');
