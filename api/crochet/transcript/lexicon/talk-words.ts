import { type Class } from './classes.ts';

/** Words of talk that give a sentence its shape: repeats, results, corrections, fillers. Class, value, phrases. */
export const TALK_WORDS: readonly (readonly [Class, string | number, string])[] = [
  ['I', 0, `in, into, on, onto, over, under, inside, in to, inside of, on top of, over top of`],
  [
    'E',
    0,
    `
    each, every, all, each one, every one, each and every, every single, every single one, each single, each of
    them, each of those, all of them, all of those, everything, everybody, apiece, one apiece, each other, them
    all, the lot, every last, any, each of these, any of them, both, everywhere, every time, each time, the whole time, the entire time, whole time, entire time, every single time, everywhere you see a stitch,
    wherever you see a stitch`,
  ],
  ['O', 1, `opening, very first`],
  ['M', 0, `same, very same`],
  [
    'X',
    0,
    `
    next, next one, following, following one, other, other one, one after, one beside it, neighbor, neighbour,
    next door, one after that, second next`,
  ],
  ['L', 0, `last, last one, final, very last, end one, very last one, last of all`],
  [
    't',
    0,
    `
    times, time around, time round, time about, lots, sets, helpings, verses, repeats, rounds of that, times over, times around, times round,
    times in all, times altogether, times total, times in total, lots of that, lots of it`,
  ],
  ['t', 2, `twice, twice over, 2 times, on both sides, on both the sides`],
  ['t', 3, `thrice`],
  ['t', 1, `once, one time`],
  [
    'o',
    0,
    `
    each side, each edge, per side, per edge, every side, every edge, edges, of those, of them, of these, of that, of em, such pairs, such, of each, of those pairs, of them
    pairs, sides, corners in all`,
  ],
  [
    'R',
    0,
    `
    repeat, repeats it, keep on, keep going, keep at that, keep doing, keep that up, keep up, carry on, carrying
    on, and so on, so on, so forth, et cetera, etc, do that, do those, do it, do this, repeat that, repeat it,
    repeat this, repeating, that same thing, do that bit, do that part, that pair, over and over, go on, going
    on, continue, continuing, on like that, like that, keep repeating, alternate, alternates, alternating, do it
    over, do them`,
  ],
  [
    'R',
    'again',
    `
    again, once again, over again, once more, one more time, do it again, and again, all over again`,
  ],
  [
    'A',
    0,
    `
    around, all the way around, all the way round, the whole way around, the whole way about, the whole way back, on around, the whole way round, all round, all
    around, right round, right around, clear around, all the way across, all the way along, all the way, the
    whole way, the whole round, the whole row, whole way, across, to the end, till the end, until the end, to
    the marker, to your marker, till the marker, till your marker, until your marker, until the marker, until
    you meet the marker, until you reach the marker, until you get to the marker, till you meet the marker, till
    you reach the marker, till you run out, until you run out, back to the marker, to the beginning, to the
    start, back to the start, to where you began, to where you started, round to where you began, along, the
    entire round, the entire way, the rest of the way, to the seam, until you return to the seam, to the join,
    until you reach the join, back to the beginning, till you are back, until you are back, until you are home,
    till you are home, full round, the entire row, all along, to the finish, whole round, whole row, over and
    over to the start, round the whole thing, the length of it, down the line, until you are back where you started, till you get back, until you get back around, to the end of the
    round, to the end of the row, to the other end, the whole lap`,
  ],
  [
    '=',
    0,
    `
    means, just means, that is, it is, there is, there are, that gives, gives you, gives us, gives me, which gives, that makes, which makes, makes, making,
    comes to, brings you to, bring you to, brings us to, brings it to, brings me to, bring it to, you will have,
    you should have, you have, you have got, you got, i have, i have got, we have, we have got, you get, you end
    up with, end up with, ends up with, we end up with, gets you, gets us to, get to, down to, up to, to get, so
    that is, left with, are left, leaves you, leaves, leaving, leaves you with, leave you with, total, totals, totaling,
    totalling, for a total of, a total of, in total, all told, altogether, should be, you should be at, you are
    at, i am at, at, takes you to, takes us to, takes us back to, that takes you, takes it to, comes out to,
    come out to, come out with, adds up to, back to, equals, sum, sum is, total is, balance, you will be at,
    ending with, end with, end up at, ends at, stays at, stay at, still, remain, remains, so, for, makes it,
    land on, you land on, it is, its, we are at, finish with, finish on, says, say, aiming for, you are after,
    after, you want, want to see, check for, be looking at, looking at, i make it, i make that, got, be, that
    should be, should give you, puts you at, put you at, lands you on, reduces us to, reach, reaches,
    numbers, come to, you will come to, arrive at, stitches is, count is, counts, hits, hit,
    holding, now have, making it, and get, which is, have, holds at, brings that to,
    bringing you to, bringing it to, giving you, giving us, giving, you find, find, up at, goes down to, goes
    to, went to, drops to, down at, back at, back up to, is what is left, grand total, grows to, comes out at,
    works out at, works out to`,
  ],
  [
    'y',
    0,
    `
    yarn over, yarn round, wool over, cord over, yarn round hook, wool round, pull through, pull up, draw
    through, draw up, drawn up, draw a loop, pull up a loop, loops on the hook, loops on your hook, loops on
    hook, on the hook, on your hook, insert the hook, insert, hook in, draw it through, pull it through, off 2,
    wrap the yarn, wrap, insert your hook, wool round the hook, go in pull up, three loops, 3 loops, 4 loops, 5
    loops, 6 loops, 7 loops, through all, through both of those, hook goes, stick goes in, loops waiting, scoop,
    grab a loop, fetch the yarn`,
  ],
  [
    'Y',
    0,
    `
    sorry, no sorry, no wait, i mean, wait no, forgive me, no forgive me, beg your pardon, i beg your pardon,
    scratch that, correction, no hang on, hang on no, excuse me no, let me try that again, no no, make that, i
    tell a lie, tell a lie, my mistake, rather, hold on no, no that is wrong, that is wrong, i meant, oops, oops
    no, whoops, strike that, no ma'am, no sir`,
  ],
  ['c', 0, `count, counting, counted, count up, count em, count them, count it`],
  [
    'n',
    0,
    `
    not, do not, does not, don't, doesn't, no, never, without, won't, isn't, is not, did not, didn't, neither,
    nor, nobody, dinnae, doesnae, wasn't, can't, cannot, aren't, not a`,
  ],
  [
    '&',
    0,
    `
    and, then, and then, plus, followed by, after that, and after that, but, and after those, after those, next
    comes, with`,
  ],
  [
    'v',
    0,
    `
    is, 's, are, 're, was, were, goes, go, has, had, do, does, did, done, did, you do, we do, you are, get,
    gets, wants, asks for, takes, take, makes of, you put, put, give it, you go, work, works, worked, place,
    make, comes, follow, follows, use, will, 'll, can, need, needs, going to, gonna, you will, i will, we will,
    you`,
  ],
  [
    'a',
    0,
    `
    the, a, an, your, my, our, his, her, its, that, this, those, these, them, it, there, of, you, we, i, us, me,
    he, she, they, some, ye, yer, one's, 'd, 've, 'm, here, em, ya, what`,
  ],
  ['m', 0, `more, extra, another, additional, other, further`],
  ['b', 0, `between, in between`],
  [
    '~',
    0,
    `
    a pair of, okay, ok, so, now, um, uh, er, erm, right, alright, all right, well, like, just, simply, really, literally,
    kind of, kinda, sort of, basically, honestly, actually, obviously, you know, i guess, only, please, gonna,
    going, also, always, hmm, oh, ah, yeah, yes, love, my love, folks, everyone, everybody here, baby, sugar,
    only, too, still, once, very, quite, exactly, simply, here, there, back, righto, um so, i think, i believe,
    i suppose, let us, lets, say, let me, start, nice, neat, kindly, merely, this time, little, big, lovely, long, tall`,
  ],
  [
    'p',
    0,
    `
    before, until, till, like, as, than, from, since, during, when, where, while, finished, recap, of, through`,
  ],
  ['r', 0, `through, thru, to, up to, up through, until, till, through to, right up to`],
];
