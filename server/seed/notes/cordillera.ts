import anchor from './cordillera-anchor';
import climber from './cordillera-climber';
import debris from './cordillera-debris';
import mission from './cordillera-mission';
import sizing from './cordillera-sizing';
import tape from './cordillera-tape';
import type { DemoProgramme } from '.';

/** An Earth line from a floating anchor near the equator, coming up to its PDR. */
export const cordillera: DemoProgramme = {
	code: 'CL',
	title: 'Cordillera Line',
	summary: 'Earth, ocean-anchored, 14\u202ft climbers',
	gates: [
		{ kind: 'SRR', name: 'System requirements review', inDays: 0 },
		{ kind: 'PDR', name: 'Preliminary design review', inDays: 77 },
		{ kind: 'CDR', name: 'Critical design review', inDays: 315 }
	],
	notes: [mission, tape, climber, sizing, anchor, debris]
};
