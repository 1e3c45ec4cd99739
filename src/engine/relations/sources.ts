// Books that many entries cite.

export const incropera =
  'Incropera, DeWitt, Bergman & Lavine, Fundamentals of Heat and Mass Transfer, 6th/7th ed. (Wiley)';
export const shahLondon = 'Shah & London, Laminar Flow Forced Convection in Ducts (Academic Press 1978)';
export const vdiHeatAtlas = 'VDI Heat Atlas, 2nd ed. (Springer 2010)';
export const cengel = 'Cengel, Heat and Mass Transfer: A Practical Approach, 3rd ed. (McGraw-Hill)';
export const holman = 'Holman, Heat Transfer, 10th ed. (McGraw-Hill)';
export const handbookOfHeatTransfer =
  'Rohsenow, Hartnett & Cho (eds.), Handbook of Heat Transfer, 3rd ed. (McGraw-Hill 1998)';
export const collierThome = 'Collier & Thome, Convective Boiling and Condensation, 3rd ed. (Oxford 1994)';
export const kakacLiu = 'Kakac & Liu, Heat Exchangers: Selection, Rating and Thermal Design';
export const exchangerHandbook = 'Heat Exchanger Design Handbook (Hemisphere/Begell House)';
export const shahSekulic = 'Shah & Sekulic, Fundamentals of Heat Exchanger Design (Wiley 2003)';
export const singlePhaseHandbook =
  'Kakac, Shah & Aung (eds.), Handbook of Single-Phase Convective Heat Transfer (Wiley 1987)';
export const serth = 'Serth, Process Heat Transfer (Academic Press)';
export const perry = "Perry's Chemical Engineers' Handbook, 8th ed.";
