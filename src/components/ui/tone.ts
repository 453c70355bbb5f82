/** The meanings that a small label, a line or a figure can be coloured by; words always say the same thing. */
export type Tone = 'neutral' | 'verdigris' | 'brass' | 'gun-blue' | 'oxide';

export const TONE_TEXT: Record<Tone, string> = {
  neutral: 'text-lead-grey',
  verdigris: 'text-verdigris',
  brass: 'text-brass',
  'gun-blue': 'text-gun-blue',
  oxide: 'text-oxide',
};
