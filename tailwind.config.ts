import type { Config } from 'tailwindcss';

const token = (name: string) => `var(--${name})`;

const config: Config = {
  content: [],
  theme: {
    screens: { tablet: '700px', wide: '1000px', full: '1120px' },
    colors: {
      transparent: 'transparent',
      current: 'currentColor',
      paper: token('paper'),
      wash: token('wash'),
      ink: token('ink'),
      graphite: token('graphite'),
      rule: token('rule'),
      hairline: token('hairline'),
      pen: token('pen'),
      pass: { DEFAULT: token('pass'), text: token('pass-text') },
      fail: { DEFAULT: token('fail'), text: token('fail-text') },
      open: { DEFAULT: token('open'), text: token('open-text') },
      s1: token('s1'),
      s2: token('s2'),
      si: token('si'),
      band: { DEFAULT: token('band'), outer: token('band2') },
    },
    fontFamily: {
      serif: token('face-serif'),
      sans: token('face-sans'),
      mono: token('face-mono'),
    },
    fontSize: {
      front: ['44px', { lineHeight: '52px', letterSpacing: '-0.012em' }],
      'front-phone': ['30px', { lineHeight: '38px', letterSpacing: '-0.012em' }],
      statement: ['27px', '36px'],
      'statement-phone': ['22px', '30px'],
      lead: ['17px', '26px'],
      'lead-phone': ['16px', '24px'],
      title: ['22px', '28px'],
      section: ['18px', '24px'],
      group: ['14px', '20px'],
      body: ['15px', '24px'],
      table: ['14px', '20px'],
      head: ['13px', '16px'],
      note: ['13px', '20px'],
      reason: ['13px', '18px'],
      caption: ['14px', '20px'],
      code: ['12px', '20px'],
    },
    borderRadius: { none: '0', field: '2px' },
  },
};

export default config;
