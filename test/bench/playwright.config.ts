import { defineConfig } from '@playwright/test';
import base from '../../playwright.config.ts';

/** Measurements in the browser: one at a time, on a quiet machine, never part of the tests. */
export default defineConfig({ ...base, testDir: '.', testMatch: '*.screen.ts', workers: 1, reporter: 'list' });
