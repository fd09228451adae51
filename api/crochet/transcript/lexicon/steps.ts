/** What is done between rounds, by how it is said. The first that matches at a word names the step. */
export const STEPS: readonly { readonly topic: string; readonly words: RegExp }[] = [
  {
    topic: 'marker',
    words:
      /^(?:(?:pop|put|place|hang|stick|clip|slip|use|add)\b.{0,18}\b(?:marker|bobby pin|paper clip|safety pin|piece of yarn|loop of thread|scrap)|marker (?:in\b|please)|put something in there|hang my loop|put a paper)/,
  },
  {
    topic: 'eyes',
    words:
      /^(?:(?:pop|put|push|place|snap|fit|insert|add)\b.{0,22}\beyes?\b|eyes? (?:go|in\b|are going|now)|the eyes go|eyes now|so the eyes\b|now the eyes\b|safety eyes? (?:go|in))/,
  },
  {
    topic: 'stuff',
    words:
      /^(?:stuff(?:ing)? (?:it|him|her|the|what|in|this|them|his|firmly|lightly|now|as)\b|stuff\b(?=.{0,12}(?:now|firm))|fill (?:it|him|her|the|his|them|this|in|up)\b|(?:now )?you fill it|pack it\b|jam .{0,22}(?:inside|in)|(?:push|put|poke|shove|add|work|tuck) .{0,28}\b(?:stuffing|filling|fluff|fill|polyfill|batting|toy filling)\b|(?:a )?(?:little|tiny|bit of|wisp of|pinch of|some) (?:bit of )?(?:fluff|filling|stuffing)\b|they get a little stuffing|stuffing in\b|fluff fluff|just shove|pebbles in)/,
  },
  {
    topic: 'embroider',
    words:
      /^(?:embroider\b|(?:put|sew|stitch|draw|add|make|do) .{0,20}\b(?:nose|smile|mouth|face|whiskers|thumbprint|spines|cheeks)\b|spines\b|with a (?:bit of|contrasting) .{0,20}(?:thumbprint|embroider)|i do 2 tiny|sew on 2 eyes)/,
  },
  {
    topic: 'colour',
    words:
      /^(?:(?:change|switch(?:ing)?|swap|go|going|back) (?:over )?(?:to|go) (?:the|a|your|my|contrast|natural)\b.{0,26}|(?:change|quick change) (?:color|colour)|(?:change|quick change)\b.{0,8}\b(?:to|color|colour)|(?:join|bring in|tie in|pick up|hook in|take|introduce|drop|lose|break off|cut|snip) (?:the|my|your) (?:new |second |next |contrast )?(?:orange|red|blue|green|pink|white|black|brown|cream|gray|grey|yellow|teal|rust|oatmeal|gold|maroon|tan|purple|color|colour|contrast|natural|navy|mustard|second|other)\b|next color|next colour|line change|cream (?:has to be introduced|joins|is cut)|white for the|here we say goodbye to|(?:red|green|blue) away|i am (?:switching|putting in|going to switch)|tie the red on)/,
  },
  {
    topic: 'block',
    words:
      /^(?:block\b|wet (?:it|block)|steam it|soak it|pin (?:it|them|the)\b.{0,20}(?:out|flat|edges|size)|press it (?:flat|under|lightly)|want to block|wanna block)/,
  },
  {
    topic: 'sew',
    words:
      /^(?:sew\b(?! on 2)|we sew\b|you sew\b|whip\b|attach\b|assembl|stitch (?:it|them|the|one tab|him)\b|sewing\b|put him together|tie the leaves|make him up|pin them up|roll it up|fold (?:that|it|the)\b|wrap it around|cap on first|leaves go on|button on|the ties are sewn|set the peas|wings just)/,
  },
  {
    topic: 'join',
    words:
      /^(?:join (?:the|in|your|a|them|two|these|with)\b|to join them|join in\b|bring the short ends|put your wool in|stick your hook in|lay the hat|fold it and knot|hook the yarn on)/,
  },
  {
    topic: 'finish',
    words:
      /^(?:fasten (?:it |that |this )?off|fasten the|finish (?:it |that )?off|cut (?:it|the|your|that|a|this|off)\b|cut (?=and|tuck)|break (?:off )?(?:the|your|it|off)\b|snip\b|tie (?:it|that) off|close (?:it|that|up)\b|you know how to close|cinch\b|draw (?:it|the|up)\b.{0,12}(?:up|tight|in|through)|pull (?:it|up|the) .{0,16}(?:closed|hole)|weave (?:in|it|the)\b|hide (?:that|the|your|both|it)\b|bury\b|leave (?:yourself |me )?(?:a|enough)\b.{0,14}(?:tail|sew)|long tail|(?:a )?tail cut|tuck\b|leave the end|leave a (?:good )?tail|run it through|darn\b|knot the end|okay now cut|then cut that|off with the)/,
  },
  {
    topic: 'surface',
    words: /^(?:surface slip stitch|take the white and run|take a contrast yarn|run a slip stitch up)/,
  },
  {
    topic: 'finish',
    words:
      /^(?:run a narrow ribbon|did a fringe|put a loop on|ribbon is threaded|the ribbon is|last thing is the|lastly the)/,
  },
];
