export { whyAhead, type Difference, type WhyAhead } from './why-ahead.js';
