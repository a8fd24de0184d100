/** A line that is slack somewhere has neither a side displacement nor a lowest period. */
import type { Line } from '../line/line';
import { slackIn } from '../line/slack';
import type { Hanging } from '../line/tension';
import { Refused } from '../methods/refused';
import { kilometres } from '../quantities/format';

/** @throws Refused that says where it is slack. */
export function requireTaut(line: Line, hanging: Hanging): void {
	const greatest = hanging.stretches.reduce(
		(most, { lower, upper }) => Math.max(most, lower, upper),
		0
	);
	const [slack] = slackIn(line, hanging, greatest);
	if (!slack && greatest > 0) return;
	const where = slack
		? `slack from the radius ${kilometres(slack.from)} to ${kilometres(slack.to)}`
		: 'under no tension';
	throw new Refused(`The line is ${where}: nothing holds it straight.`, {
		remedy: 'Add counterweight, or take masses off the line.'
	});
}
