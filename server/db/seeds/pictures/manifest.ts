import type { FilePurpose } from '../../../../shared/contracts/vocabulary.ts';

export interface DemoPicture {
  fileName: string;
  /** Caption under the picture. */
  title: string;
  /** What is to be seen, for those who cannot see it. */
  alt: string;
  pieceKey: 'salt-lantern' | 'heron' | 'second-winter' | 'cartographer';
  purpose: FilePurpose | 'drawing';
}

const saltLantern = (name: string, purpose: DemoPicture['purpose'], title: string, alt: string): DemoPicture => ({
  fileName: `salt-lantern-${name}.jpg`,
  title,
  alt,
  pieceKey: 'salt-lantern',
  purpose,
});
const heron = (name: string, purpose: DemoPicture['purpose'], title: string, alt: string): DemoPicture => ({
  fileName: `heron-${name}.jpg`,
  title,
  alt,
  pieceKey: 'heron',
  purpose,
});
const secondWinter = (name: string, purpose: DemoPicture['purpose'], title: string, alt: string): DemoPicture => ({
  fileName: `second-winter-${name}.jpg`,
  title,
  alt,
  pieceKey: 'second-winter',
  purpose,
});
const cartographer = (name: string, purpose: DemoPicture['purpose'], title: string, alt: string): DemoPicture => ({
  fileName: `cartographer-${name}.jpg`,
  title,
  alt,
  pieceKey: 'cartographer',
  purpose,
});

/**
 * Pictures of the demo's pieces, drawn by `server/scripts/pictures/draw-pictures.ts`. Of one piece and purpose, they
 * are handed out in this order.
 */
export const DEMO_PICTURES: readonly DemoPicture[] = [
  saltLantern(
    'cover',
    'cover',
    'The lantern lit on the bench',
    'A brass and walnut hilt on an oiled bench top, light showing between the bars of its lantern section',
  ),
  saltLantern(
    'section',
    'drawing',
    'Section and pommel',
    'A pencilled section of the hilt with its pommel drawn apart, a pencil lying on the sheet',
  ),
  saltLantern(
    'daylight',
    'message',
    'Harbour patina in daylight',
    'The hilt on a linen cloth in window light, its brass gone brown and gold in patches',
  ),
  saltLantern(
    'stuck',
    'message',
    'Stuck at 2 mm',
    'The pommel drawn out of the hilt by a narrow gap, the knurled collar beside it',
  ),
  saltLantern(
    'rub',
    'before',
    'Rub mark in the bore',
    'Looking into the bore of the hilt: a bright smear low on one side of a dull wall',
  ),
  saltLantern(
    'spigot',
    'before',
    'Spigot, 32.05',
    'The pommel stood on a ring, its spigot between the jaws of a caliper that reads 32.05',
  ),
  saltLantern(
    'turned',
    'after',
    'Spigot turned, 31.93',
    'The pommel with its spigot bright from turning, between the jaws of a caliper that reads 31.93',
  ),
  saltLantern(
    'arrived',
    'condition',
    'As it came in',
    'The hilt lying along a steel rule on grey leather, its whole length to be seen',
  ),
  saltLantern(
    'parcel',
    'condition',
    'Before the box was closed',
    'The hilt wrapped in tissue, lying on crumpled paper in an open carton',
  ),
  saltLantern(
    'chassis',
    'message',
    'Chassis with the cell in',
    'A dark cradle on a cutting mat with a round cell, a sound board, a loudspeaker and a strip of LEDs',
  ),
  saltLantern(
    'wiring',
    'message',
    'Six on the near edge, two on the far',
    'A green sound board close up, coloured wires soldered to the pads on both of its edges',
  ),
  saltLantern(
    'sketch',
    'drawing',
    'Wiring sketch',
    'A sheet with cell, board, switch and LEDs as boxes, joined by lines in coloured pencil',
  ),
  saltLantern(
    'lit',
    'message',
    'A blade from the shelf, to choose the white',
    'The hilt in a dark room with a warm white blade lit',
  ),

  heron(
    'cover',
    'cover',
    'Blackened, before the wax',
    'A slender black steel hilt with a copper band on grey leather, its front cut off slantwise',
  ),
  heron(
    'drawing',
    'drawing',
    'Body and front piece',
    'A pencilled section of the body with the front piece drawn apart and larger below',
  ),
  heron(
    'bright',
    'message',
    'Turned, with the band shrunk on',
    'The hilt in bright steel on a green cutting mat, with a copper band',
  ),
  heron(
    'tight',
    'before',
    'Stops short of its seat',
    'The front piece standing off the body, a ring of bright spigot between them',
  ),
  heron('waxed', 'condition', 'Marks before posting', 'The black hilt lying upright on grey linen beside a steel rule'),
  heron('lit', 'message', 'A blade from the shelf, cold blue', 'The hilt in a dark room with a blue blade lit'),

  secondWinter(
    'cover',
    'cover',
    'The older piece that it pairs with',
    'A grey aluminium hilt with four bone-coloured rings on black felt',
  ),
  secondWinter(
    'drawing',
    'drawing',
    'Section, 282 over all',
    'A pencilled section of the hilt, the length of 282 ringed in red',
  ),
  secondWinter(
    'length',
    'message',
    '282 is on the drawing',
    'Part of a drawing on a cutting mat with a rule and a pencil, the length of 282 ringed in red',
  ),
  secondWinter(
    'parts',
    'condition',
    'Turned, rings cast',
    'A turned aluminium body, its pommel and three loose resin rings on a cutting mat',
  ),
  secondWinter(
    'switch',
    'message',
    'Ring at half brightness',
    'A switch in a grey aluminium body, a pale blue ring of light round it',
  ),

  cartographer(
    'cover',
    'cover',
    'The Cartographer',
    'A patinated bronze hilt with engraved contour lines and a globe for a pommel, on brown leather',
  ),
  cartographer(
    'drawing',
    'drawing',
    'Engraving, unrolled',
    'A sheet with a section of the body and, below it, the contour lines laid out flat',
  ),
  cartographer(
    'dragging',
    'before',
    'Scores on the spigot',
    'The globe pommel on a cutting mat, bright scores along its dull spigot',
  ),
  cartographer(
    'eased',
    'after',
    'Polished, 30.95',
    'The globe pommel with a polished spigot between the jaws of a caliper that reads 30.95',
  ),
  cartographer(
    'packed',
    'condition',
    'Packed for the last leg',
    'The hilt wrapped in tissue in an open carton, seen from above',
  ),
  cartographer(
    'patina',
    'message',
    'Half way along',
    'The bronze body, one half browned and green, one half bare, with a brush and a dish of liquid',
  ),
  cartographer('emitter', 'message', 'The mouth', 'The notched mouth of the bronze hilt, close up'),
];
