import { defineConfig } from 'vite';
import { barePage } from '../../bare-page.ts';

export default defineConfig(barePage('test/fault/harness', '.fault-harness'));
