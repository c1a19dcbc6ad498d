import { checkRowSecurity } from '../db/check-rls/check-rls';
import { currentUrls, withClient } from './start/database';

/** `npm run check-rls`: asks the running (or given) database whether one organisation could see another's rows. */
const { urls } = currentUrls(process.env, process.cwd());
const complaints = await withClient(urls.owner, checkRowSecurity);
process.stdout.write(complaints.length === 0 ? 'Row security is in order.\n' : `${complaints.join('\n')}\n`);
process.exitCode = complaints.length === 0 ? 0 : 1;
