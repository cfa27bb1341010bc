/** The product's colours, as mail programs need them: written out. Light, and dark where supported. */
export const mailColours = {
  surface: ['#f5f4ef', '#10171a'],
  card: ['#ffffff', '#182125'],
  ink: ['#1a2327', '#e9edea'],
  ink2: ['#53616a', '#9faeb4'],
  line: ['#deded7', '#2b383e'],
  kelp: ['#1e6a57', '#62bfa0'],
  onKelp: ['#ffffff', '#0c1a16'],
  alert: ['#b23a1e', '#ff8c6e'],
} as const;

export const light = (name: keyof typeof mailColours): string => mailColours[name][0];
export const dark = (name: keyof typeof mailColours): string => mailColours[name][1];
