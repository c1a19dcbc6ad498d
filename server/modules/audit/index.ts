export { recordAudit } from './audit.repository';
export { differences } from './differences';
