/**
 * Words that passwords are most often made of, from memory. With digits and signs around them, signs for letters, and
 * two of them in a row, they stand for many thousands of common passwords.
 */
const WORDS = `
password passwort passwd passphrase motdepasse contrasena wachtwoord haslo parola senha losenord salasana lozinka heslo
pass word login logon signin welcome willkommen bienvenue bienvenido welkom hello hallo bonjour hola hi hey test tester
testing test testtest demo sample example admin administrator administrateur root superuser sysadmin system sys user
username utilisateur benutzer guest gast master manager operator supervisor planner planning steadmain steam boiler
retort kettle factory plant production changeme change default temp temporary secret secrets private letmein openup open
sesame opensesame access enter entry unlock key keys keyboard qwerty qwertz azerty asdf asdfgh zxcv zxcvbn qwer abc abcd
abcde abcdef abcdefg alphabet number numbers digits computer laptop desktop windows linux macintosh android iphone
samsung nokia google facebook twitter youtube yahoo hotmail gmail outlook internet website server network database
oracle cisco office work job boss company business office money cash dollar euro pound bank banking credit visa rich
million lucky luck happy smile sunny sunshine sun moon star stars sky heaven angel angels devil demon god jesus christ
church bless faith hope love lover lovely loveme loveyou iloveyou ilove iloveu youandme forever always never baby babe
babygirl babyboy honey sweet sweetie sweetheart sugar candy cookie chocolate cherry apple banana orange lemon peach
strawberry coffee pepper ginger cinnamon pumpkin butter cheese pizza burger chicken bacon sausage beer whisky whiskey
vodka wine tequila princess prince queen king kingdom royal lady girl girls boy boys man woman mother mom mommy mama mum
mummy father dad daddy papa brother sister family friend friends friendship buddy wife husband child children kids son
daughter michael jennifer jessica ashley daniel matthew andrew joshua robert thomas william david james john joseph
charles george richard anthony christopher nicholas alexander benjamin samuel jonathan patrick stephen steven kevin brian
jason justin brandon ryan eric mark paul peter simon martin stefan andreas markus klaus hans karl peter petra sabine
claudia nicole sandra martina julia anna maria laura sarah sara emma emily sophie sophia olivia charlotte amanda samantha
melissa michelle stephanie elizabeth victoria natalie rachel rebecca hannah katie kate lisa linda karen susan barbara
patricia margaret nancy betty helen donna carol ruth sharon maggie molly lucy daisy rosie ruby lily rose flower flowers
summer winter spring autumn fall january february march april may june july august september october november december
monday tuesday wednesday thursday friday saturday sunday today tomorrow yesterday morning evening night midnight
weekend holiday christmas xmas easter halloween birthday party dance music guitar piano drummer rock rocknroll metal
metallica nirvana beatles eminem elvis madonna football fussball soccer baseball basketball hockey golf golfer tennis
cricket rugby swimming running runner player players champion champ winner winning team goal arsenal chelsea liverpool
manchester united everton tottenham barcelona madrid realmadrid juventus milan inter bayern dortmund celtic rangers
yankees cowboys steelers packers eagles lakers bulls dodgers redsox dallas chicago newyork london paris berlin munich
hamburg vienna zurich amsterdam rotterdam brussels madrid lisbon rome dublin glasgow edinburgh england scotland ireland
wales france germany deutschland spain italy italia espana portugal brasil brazil argentina mexico canada america
american australia china india japan russia africa europe world earth planet ocean river lake mountain forest island
beach water fire ice snow storm thunder lightning rain rainbow wind tiger lion bear wolf wolves eagle falcon hawk
phoenix dragon dragons unicorn monkey gorilla elephant horse horses pony cat cats kitty kitten dog dogs doggy puppy
rabbit bunny mouse hamster bird duck chicken turtle snake spider shark dolphin whale fish fishing butterfly bailey
buster charlie max rocky tigger shadow smokey bandit lucky lassie simba pokemon pikachu mario nintendo playstation xbox
minecraft fortnite roblox gamer gaming game games batman superman spiderman ironman avengers marvel hero heroes starwars
jedi yoda skywalker vader matrix neo trinity hobbit gandalf frodo harry potter hogwarts hermione sherlock bond jamesbond
knight knights warrior warriors hunter hunting killer ninja samurai pirate pirates viking vikings wizard magic magical
mystery ghost monster zombie vampire freedom liberty peace justice power powerful strong strength energy turbo speed
racing racer ferrari porsche mercedes bmw audi volkswagen toyota honda nissan mazda subaru ford mustang corvette camaro
chevy chevrolet harley davidson yamaha suzuki kawasaki ducati trucker truck tractor farmer cowboy cowgirl redneck army
navy marine marines soldier police fireman doctor nurse teacher student school college university engineer mechanic
driver pilot captain general sergeant commander chief black white blue red green yellow orange purple pink silver golden
gold diamond crystal pearl platinum copper iron steel metal one two three four five six seven eight nine ten zero hundred
thousand first second last best great good better super mega ultra cool awesome amazing fantastic perfect beautiful
pretty handsome sexy hot fuck fucker fuckyou fuckoff shit bitch asshole bastard crap damn whatever nothing something
anything everything everyone nobody somebody someone please thanks thankyou sorry goodbye bye trustno trustme trust
nopassword mypassword thepassword newpassword oldpassword yourpassword userpassword adminadmin rootroot passpass my your
our the this that and for with you me us it is not yes no new old big little small crazy funny silly stupid smart genius
zaq xsw cde vfr bgt nhy mju qaz wsx edc rfv tgb yhn ujm qazwsx wsxedc zxc asd qwe iop jkl bnm uiop hjkl poiu lkjh mnbv
lol rofl omg wtf xyz xxx aaa bbb zzz
`;

export const COMMON_WORDS: ReadonlySet<string> = new Set(WORDS.trim().split(/\s+/));
