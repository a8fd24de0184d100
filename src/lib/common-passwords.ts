/**
 * Words that stand at the head of every list of leaked passwords (from memory): with figures or marks
 * before or after them they are tried first, however long the result.
 */
export const COMMON = new Set(
	`password passwort passord motdepasse contrasena senha letmein letmeinplease welcome welcomeback
	iloveyou iloveyousomuch admin administrator administrator root superuser changeme changemenow
	changeit pleasechangeme default temporary temppassword secret topsecret mypassword newpassword
	thepassword passwordpassword passwordadmin adminadmin adminpassword welcomepassword qwerty
	qwertyqwerty qwertyuiop qwertyuiopasdf asdfghjkl asdfghjklzxcvbnm zxcvbnm qazwsx qazwsxedc
	qazwsxedcrfv qwertzuiop azertyuiop baseball football basketball liverpool manchesterunited
	chelsea arsenal sunshine princess dragon monkey shadow master superman batman spiderman pokemon
	starwars startrek trustno trustnoone whatever computer internet computerscience samsung michael
	michaeljordan jennifer jordan charlie ashley bailey summer winter spring autumn january february
	monday friday january december november october september august freedom mustang corvette
	ferrari mercedes harleydavidson chocolate butterfly hello helloworld hellokitty ginger cookie
	purple orange banana flower access accessdenied correcthorsebatterystaple opensesame
	thisisapassword thisismypassword nopassword nothing unknown test testing testtest testpassword
	guest guestguest user username login loginlogin company engineer engineering spaceelevator
	spacetether holdfast holdfastholdfast`.split(/\s+/)
);
