/** Letters of other alphabets and forms that look Latin, one unit for one unit, so that positions stay. */
const LOOKALIKE = new Map<string, string>();
const pair = (from: string, to: string) => Array.from(from).forEach((letter, i) => LOOKALIKE.set(letter, to[i]!));
pair('асеорхуіјѕԁһкмтнвгпԛԝɡ', 'aceopxyijsdhkmthbrnqwg');
pair('АСЕОРХУІЈЅКМТНВЗ', 'aceopxyijskmthb3');
pair('αοενρτυικχΑΒΕΖΗΙΚΜΝΟΡΤΥΧ', 'aoevptuikxabezhikmnoptyx');
pair('ᴀʙᴄᴅᴇꜰɢʜɪᴊᴋʟᴍɴᴏᴘʀꜱᴛᴜᴠᴡʏᴢ', 'abcdefghijklmnoprstuvwyz');
pair('ᵃᵇᶜᵈᵉᶠᵍʰⁱʲᵏˡᵐⁿᵒᵖʳˢᵗᵘᵛʷˣʸᶻ', 'abcdefghijklmnoprstuvwxyz');
pair('⁰¹²³⁴⁵⁶⁷⁸⁹₀₁₂₃₄₅₆₇₈₉', '01234567890123456789');
pair('✕✖╳⨯', '××××');
pair('→⇒➔➜➡►', '>>>>>>');
pair('‐‑‒–—―−﹣', '--------');
pair('“”„«»″', '""""""');
pair('‘’‚′`´', "''''''");
pair('⁎∗＊✱✻★☆✽†‡', '**********');
pair('【】〔〕〈〉《》❨❩❲❳', '[][]<><>()[]');
pair('、，。；：•·●▪◦○', ',,.;:......');
pair('¦│', '||');

/**
 * A text in plain small letters, of exactly the same length: look-alike letters, dashes, quotes, full-width brackets
 * and every kind of space become the plain ones.
 *
 * @example plainLetters('R4： （ѕс，inc）× 6') === 'r4: (sc,inc)× 6'
 */
export function plainLetters(text: string): string {
  const out: string[] = [];
  for (let i = 0; i < text.length; i += 1) {
    const code = text.charCodeAt(i);
    if (code < 128) {
      out.push(code >= 65 && code <= 90 ? String.fromCharCode(code + 32) : text[i]!);
      continue;
    }
    const full = code >= 0xff01 && code <= 0xff5e ? String.fromCharCode(code - 0xfee0).toLowerCase() : text[i]!;
    const like = LOOKALIKE.get(full);
    out.push(like ?? (/\s|[\u200b-\u200d\u2060\ufeff\u00ad]/.test(full) ? ' ' : lower(full)));
  }
  return out.join('');
}

const lower = (letter: string): string => {
  const small = letter.toLowerCase();
  return small.length === letter.length ? small : letter;
};
