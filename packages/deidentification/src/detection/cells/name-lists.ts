/**
 * Frequent names of the clinics' countries, lower case and without accents, and the words that stand beside names in clinical notes.
 * No list is complete; a name outside them, without a title or another cue, goes unseen. That is why a column of free text is always
 * reported.
 */
import { wordSet } from '../../word-set.ts';

/** Given names that are hardly ever another word. */
export const givenNames = wordSet(`
  aaron abdul abdullah abigail adam adrian agnes ahmad ahmed aisha alan albert alejandro aleksander alexander alexandra alfred ali alice alicia
  alison amanda amelia amina amir amy ana andrea andreas andrew angela anita anja ann anna anne annette anthony antonio anton arthur astrid
  barbara beatrice ben benjamin bernard beth bettina birgit bjorn bob brenda brian bruno camille carla carlos carmen caroline catherine
  cecilia charles charlie charlotte chloe chris christine christina christopher claire clara claudia colin craig cristina daniel daniela
  danielle david deborah debra denise dennis derek diana diego dieter dimitri dominik donald donna doris dorothy douglas edith eduardo edward
  eileen elena eleanor elisabeth elizabeth ella ellen emily emma erik erika ernst esther eva evelyn fatima felix fernando fiona florence
  francesca francesco francisco franz fred frederick friedrich gabriel gareth gary geoffrey george gerald gerhard gertrud giovanni giulia
  gillian gordon graham greta gudrun guillaume gustav hanna hannah hans harold harry hassan heather heidi heike heinrich heinz helen helena
  helga helmut henrik henry herbert hilda horst howard hugo hussein ian ibrahim ingrid irene isabel isabella isabelle ivan jacob jacqueline
  jakob jamal james jamie jane janet janice jason javier jean jennifer jeremy jerry jessica joan joanna joanne joe joel joerg johan
  johanna johannes john jonas jonathan jorge jose josef joseph joshua joyce juan judith judy juergen jorgen julia julian julie karen karin
  karl katarina katharina katherine kathleen kathryn katja keith kelly kenneth kerstin kevin khalid kirsten klaus kristina kumar kyle larry
  lars laura lauren leila leo leonard leslie lewis liam linda lisa lorenzo louis louise lucas lucia lucy luigi luis lukas luke lydia
  magdalena magnus malcolm manfred manuel marco marcus margaret margarita maria marianne marie mario marion marta martha martin martina mary
  matteo matthew matthias maureen maximilian megan mehmet melanie melissa michael michaela michel michelle miguel mohamed mohammad mohammed
  mohammad monica monika monique muhammad mustafa nadia nancy natalia natalie nathan neil nicholas nicola nicolas nicole nigel nikolaus nina
  noah nora norman olga oliver olivia olivier omar oscar otto pablo pamela paolo patricia patrick paul paula paulo pedro petra peter
  philip philippe phillip pierre priya rachel rafael raj rajesh ralf ralph ramesh raymond rebecca regina reinhard renate ricardo richard
  rita robert roberto rodrigo roger roland rolf ronald rosa rosemary rosie roy rudolf russell ruth ryan sabine sally samantha samuel sandra
  sanjay sara sarah scott sean sebastian sergio sharon sheila shirley silvia simon simone sofia sonia sophia sophie stefan stefanie stephanie
  stephen steve steven stuart sunita susan susanne suzanne svetlana sven sylvia tamara tanja teresa theo theresa thomas tiffany tim timothy
  tobias tom tony tracy udo ulrich ulrike ursula uwe valerie vanessa vera veronica victoria vincent vivian vladimir walter wendy werner
  wilhelm william wolfgang xavier yasmin yusuf yvonne zoe
`);

/** Given names that are common words too; they count only before a known surname, or after a cue and before another name. */
export const doubtfulGivenNames = wordSet(`
  amber april art august bill carol chad chase christian clay crystal curt daisy dale dawn dean dick don drew earl eve faith frank gene ginger
  glen grace grant guy hazel heath holly hope iris ivy jack jade jasmine jean jesus jan jewel joy june justice lance lane lily liv mark mason max may
  melody mercy miles misty nick norm olive pat per pearl peg penny pierce ray reed rich rob robin rod rose ruby rusty sandy skip stan sterling
  sue summer terry tiny victor violet virginia wade ward warren will woody
`);

/** Surnames. Those that are common words are in the second list. */
export const surnames = wordSet(`
  abbott abdi adams adeyemi afzal ahmed akhtar ali allen almeida alvarez andersen anderson andersson andrews armstrong arnold bailey baker
  banerjee barnes bauer baumann beck becker begum bell bennett berger bergmann bernard bianchi boateng bonnet bouchard brennan brown
  bruno bryant burke burns butler byrne campbell carlson carroll carter castillo castro chan chang chen cheng choi christensen clark clarke
  cohen coleman collins colombo connolly cooper costa cox cruz cunningham davies davis delgado diaz dietrich doherty doyle dubois dunn dupont
  durand edwards ellis engel evans fernandes fernandez ferrari ferreira fischer fitzgerald fleming flores foster fournier fraser friedrich
  fuchs gallagher garcia gibson gill gomes gomez gonzales gonzalez graham griffin griffiths gruber guerrero gupta gutierrez haas hall
  hamilton hansen harris harrison hartmann hassan henderson hernandez hoang hoffmann hofmann holmes hosseini huang huber hughes hussain
  huynh ibrahim iqbal ivanov jackson jakobsen james jansen janssen jensen jimenez johansen johansson johnson johnston jones jung kaiser kang
  kaplan karlsson kaur keller kelly kennedy khan kim klein koch kohler koenig kowalski kraus krause krueger kumar lange larsen larsson laurent
  lefebvre lehmann leroy levy lewis lim lopez lorenz macdonald mackenzie maier marino marshall martin martinez martinsen mason mayer mccarthy
  mcdonald mckenna mehta mendoza meyer miller mitchell mohammed moreau moreno morgan morris mueller muller munoz murphy murray nagy nakamura
  nelson neumann nguyen nielsen nilsson novak nowak nunez obrien oconnor odonnell okafor okeke oliveira olsen olsson oneill ortega ortiz
  owens patel patterson pedersen pereira perez peters petersen petersson petrov pham phillips powell quinn ramirez ramos reynolds ricci
  richards richardson richter rivera roberts robertson robinson rodrigues rodriguez rogers romano rossi rousseau ruiz russell russo ryan
  saito salazar sanchez sanders santos sato schaefer schmid schmidt schmitt schneider scholz schroeder schubert schulz schwarz scott shah
  sharma simmons simpson singh smith smyth soares sorensen sousa stevens stewart sullivan suzuki svensson tanaka taylor thomas thompson
  thomsen torres tran turner vargas vasquez vazquez virtanen wagner walsh watanabe watkins watson weber werner williams williamson wilson
  winkler wolf wong wright xu yamamoto yang yilmaz zhang zhao ziegler zimmermann
`);

export const doubtfulSurnames = wordSet(`
  banks barber bishop black bloom bond brook bush chambers christian cook cross day dean field fields fisher ford fox frame freeman frost
  gray green grey hand harding hardy hart hill holt house hunt hunter king knight lake lane lee little long love lynch may mills moon moore
  morrow north park parker pierce pool porter potter power price reed rice rich rivers rose rush shaw short singer snow steel stone strong
  summers sutton swan tate walker wall ward waters webb wells west white wise wood woods young zimmer
`);

/** Words that begin with a capital in notes without being a name, after a title, a cue or a given name. */
export const noNames = wordSet(`
  a able absent achieved active after agreed aid aids alert also ambulated ambulates and ankle arms asked assessed assessment assist assisted
  assistance at attended aware balance band bar bars basin began belt bilateral bike body bout bp brace bridge by calf cast chair clinic
  clonus completed complained complains continued continues contraction course crutch crutches cycle cycled daily day declined delayed denied
  denies device did difficulty discharged distance doctor does donned down due during education elbow emg ended energy equipment eval
  evaluation exam exercise exercises exoskeleton extension fair fall fatigue fatigued feels fell fes felt finished fist flexion foot for frame
  fim friday from full gait gave glove good grade grip gym had half hand handed happy harness has have he heart heel helped her high hip his hold
  hospital hours housing if improved in independent index initial instructed intact is it joint keen knee knees lateral left leg legs lesion
  level lift lifted limb line lost low lying managed maneuver manoeuvre manual march mat maximal maximum medial min mins mobility moderate
  modified monday motivated motor moved muscle muscles needed neck needs negative new no normal not note noted notes nurse of off on ongoing
  onto or orthosis orthotic out outdoor overground pain palsy parallel paralysis partial passive performed phase plan pelvis pinprick placed
  plantar poor position positive post pre present presented progress progressing progressed protocol provided pulley pump push quad quads
  raised range reached ready reflex refused reported reports requested requires rest rested resting result results review reviewed right ring robot rods
  rocker rolled rom rotation said sat saturday scale scored score seated seen sensation session sessions set she shoe shoes shoulder showed
  side sign sit sitting skin sling slow spasm spasms spasticity speed splint stage stair stairs stance stand standing stated states step
  stepped steps stick stopped strap stretch stretched strength strike strong sunday support swing syndrome table test therapist therapy
  thigh thursday timed tired to today toe toes tolerance tolerated tolerates tone total transfer transferred transfers treadmill trial trunk
  tuesday turn turned unable unaided unilateral unit unstable until up upper upright using valve verbalised verbalized very walk walked walker
  walking walks wanted wants warm was wednesday week weight well went wheelchair while will wire with without workshop wrist yes
`);

/** Words after which the words before name a sign, test or tool: Thomas Test, May Thurner syndrome. */
export const eponymNouns = wordSet(`
  classification disease fracture frame grade index law lesion lift maneuver manoeuvre method palsy paralysis phenomenon position procedure
  reflex scale score sign splint syndrome technique test tube valve
`);
