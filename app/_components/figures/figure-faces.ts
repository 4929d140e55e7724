const faces = ['12px "Source Sans 3"', '600 12px "Source Sans 3"', 'italic 12px "STIX Two Text"', '12px "STIX Two Text"', '12px "Fourfold Signs Serif"'];

/** Asks for the faces a canvas writes in, for which it does not wait by itself, and calls back when they are there or cannot be had. */
export function whenFacesAreThere(then: () => void): void {
  void Promise.all(faces.map((face) => document.fonts.load(face, 'L2∞'))).then(then, then);
}
