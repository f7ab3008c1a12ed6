/** The passphrase that every account of the demo team shares. Never used outside demo mode. */
export const demoPassword = 'a quiet tide at tern estuary';
