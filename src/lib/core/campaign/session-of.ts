import type { CampaignEvent } from './event.ts';

/** The session whose state an event can change; null when it speaks of the campaign, a plan or another event. */
export function sessionOf(event: CampaignEvent): string | null {
  switch (event.kind) {
    case 'precautions-acknowledged':
    case 'conditions-recorded':
    case 'specimen-loaded':
    case 'session-started':
    case 'session-stopped':
    case 'reading-recorded':
    case 'reading-corrected':
    case 'reading-missing':
    case 'ruined':
    case 'session-closed':
    case 'session-reopened':
      return event.data.session;
    case 'noted':
      return event.data.about === 'session' || event.data.about === 'run' ? event.data.session : null;
    case 'campaign-created':
    case 'plan-issued':
    case 'plan-amended':
    case 'shift-opened':
    case 'shift-closed':
    case 'reinstated':
    case 'undone':
    case 'contradiction-decided':
    case 'exported':
    case 'imported':
    case 'device-fault':
      return null;
  }
}
