import fc from 'fast-check';

// One seed for all properties, so that a red run can be repeated; FC_SEED tries another.
fc.configureGlobal({ seed: Number(process.env.FC_SEED ?? 20260301) });
