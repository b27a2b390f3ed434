/**
 * Usual containers to start from: content, outer diameter and label height in millimetres.
 * Common practice, no source: measure the bottle in hand before ordering labels.
 */
export interface UsualContainer {
  readonly slug: string;
  readonly name: string;
  readonly shape: 'cylinder' | 'flat' | 'taper';
  readonly diameterMm?: string;
  /** Of a cone, at the label's two edges; its label height is measured along the wall. */
  readonly topDiameterMm?: string;
  readonly bottomDiameterMm?: string;
  readonly labelHeightMm?: string;
  readonly widthMm?: string;
  readonly heightMm?: string;
}

const bottle = (slug: string, name: string, diameterMm: string, labelHeightMm: string): UsualContainer => ({ slug, name, shape: 'cylinder', diameterMm, labelHeightMm });
const cone = (slug: string, name: string, topDiameterMm: string, bottomDiameterMm: string, labelHeightMm: string): UsualContainer => ({ slug, name, shape: 'taper', topDiameterMm, bottomDiameterMm, labelHeightMm });
const face = (slug: string, name: string, widthMm: string, heightMm: string): UsualContainer => ({ slug, name, shape: 'flat', widthMm, heightMm });

export const CONTAINERS: readonly UsualContainer[] = [
  bottle('bottle-30', 'Dropper bottle, 30 ml (1 fl oz)', '33', '45'),
  bottle('bottle-50', 'Bottle, 50 ml (1.7 fl oz)', '37', '55'),
  bottle('bottle-100', 'Bottle, 100 ml (3.4 fl oz)', '44', '70'),
  bottle('bottle-150', 'Bottle, 150 ml (5 fl oz)', '49', '80'),
  bottle('bottle-200', 'Bottle, 200 ml (6.8 fl oz)', '53', '85'),
  bottle('bottle-250', 'Bottle, 250 ml (8 fl oz)', '58', '90'),
  bottle('bottle-300', 'Bottle, 300 ml (10 fl oz)', '60', '100'),
  bottle('bottle-500', 'Bottle, 500 ml (16 fl oz)', '70', '120'),
  bottle('bottle-1000', 'Bottle, 1 l (33 fl oz)', '88', '150'),
  bottle('jar-30', 'Jar, 30 ml (1 fl oz)', '48', '24'),
  bottle('jar-50', 'Jar, 50 ml (1.7 fl oz)', '52', '36'),
  bottle('jar-100', 'Jar, 100 ml (3.4 fl oz)', '67', '36'),
  bottle('jar-200', 'Jar, 200 ml (6.8 fl oz)', '84', '42'),
  bottle('stick-50', 'Deodorant stick, 50 g (1.8 oz)', '38', '80'),
  cone('tub-150', 'Tub, 150 ml (5 fl oz)', '72', '62', '46'),
  cone('tub-250', 'Tub, 250 ml (8 fl oz)', '86', '76', '56'),
  cone('tub-500', 'Tub, 500 ml (16 fl oz)', '104', '90', '76'),
  cone('pot-60', 'Pot, 60 ml (2 fl oz)', '56', '48', '36'),
  face('face-small', 'Flat label, 50 × 70 mm', '50', '70'),
  face('face-60', 'Flat label, 60 × 90 mm', '60', '90'),
  face('face-80', 'Flat label, 80 × 120 mm', '80', '120'),
  face('face-wide', 'Flat label, 120 × 70 mm', '120', '70'),
  face('face-pouch', 'Pouch label, 100 × 150 mm', '100', '150'),
  face('face-box', 'Box label, 150 × 100 mm', '150', '100'),
];

/** The overlap, and the stock (film with its adhesive), where none is given, in millimetres. Common practice, no source. */
export const USUAL_OVERLAP_MM = '5';
export const USUAL_STOCK_MM = '0.06';
