/**
 * The most common passwords of published leaks that are long enough to be typed here, in lower case. Shorter ones are
 * refused by their length.
 */
const COMMON = `
password password1 password12 password123 password1234 passw0rd p@ssw0rd p@ssword pa$$word passwort passwords
12345678 123456789 1234567890 0123456789 123456789a 12345678910 123123123 1234512345 987654321 9876543210 87654321
11111111 111111111 1111111111 00000000 000000000 0000000000 22222222 33333333 44444444 55555555 66666666 77777777
88888888 99999999 999999999 12121212 123321123 123454321 12344321 11223344 1122334455 112233445566 147258369
1472583690 741852963 789456123 159753456 135792468 1029384756 10203040 102030405060 13131313 20202020 19191919
12341234 12345679 1234qwer 1q2w3e4r 1q2w3e4r5t 1q2w3e4r5t6y 1qaz2wsx 1qaz2wsx3edc 1qazxsw2 zaq12wsx zaq1zaq1 q1w2e3r4
q1w2e3r4t5 qwer1234 qwerty12 qwerty123 qwerty1234 qwerty12345 qwertyui qwertyuiop qwertyuio qwertzui qwertzuiop
azertyui azertyuiop asdfghjk asdfghjkl asdf1234 asdfasdf zxcvbnm1 zxcvbnm123 zxcvbnma qazwsxedc qazwsx123 qweasdzxc
qwe123456 qweqweqwe abc12345 abcd1234 abc123456 a1b2c3d4 a1234567 a12345678 a123456789 aa123456 aa12345678 aaaaaaaa
aaaaaaaaaa abcdefgh abcdefg1 abcdefghi abcdefghij alphabet baseball baseball1 football football1 basketball softball
volleyball hockey123 superman superman1 batman123 spiderman pokemon1 pokemon123 starwars starwars1 naruto123
michelle michelle1 jennifer jennifer1 jessica1 ashley123 amanda123 andrew123 charlie1 daniel123 michael1 michael123
jonathan christopher christian alexander alexandra elizabeth stephanie nicholas benjamin samantha victoria patricia
butterfly sunshine sunshine1 princess princess1 iloveyou iloveyou1 iloveyou2 iloveyou123 loveyou1 lovelove beautiful
mustang1 corvette mercedes ferrari1 porsche1 computer computer1 internet trustno1 letmein1 letmein123 welcome1
welcome12 welcome123 welcome1234 changeme changeme1 changeme123 admin123 admin1234 admin12345 administrator
adminadmin rootroot root1234 toor1234 testtest test1234 test12345 testing1 testing123 guest123 default1 secret123
secretsecret master123 masterkey monkey123 dragon123 shadow123 hunter123 killer123 whatever whatever1 blink182
liverpool liverpool1 chelsea1 arsenal1 barcelona juventus manchester realmadrid bayern123 einstein cocacola
chocolate cheese123 cookie123 banana123 pineapple strawberry cinnamon snowball midnight rainbow1 diamond1 crystal1
greenday metallica slipknot nirvana1 eminem123 blessing blessed1 jesus123 jesuschrist heaven123 angel123 angels123
flower123 summer12 summer123 summer2024 summer2025 summer2026 winter123 winter2024 winter2025 winter2026 spring123
spring2025 spring2026 autumn123 autumn2025 autumn2026 january1 february september september1 november december
monday123 friday123 hello123 hello1234 hellohello goodluck goodbye1 freedom1 america1 australia canada123 england1
germany1 deutschland france123 brasil123 mexico123 samsung1 samsung123 apple123 google123 facebook facebook1
instagram linkedin1 twitter1 microsoft windows1 windows10 minecraft minecraft1 fortnite roblox123 playstation
nintendo xbox1234 gateway1 network1 security security1 access14 access123 company1 office123 business1 manager1
marketing engineer survey123 surveyor survey2026 building building1 construction demolition contractor planner1
tallystone tallystone1 tallystone123 saltmarsh ropewalk
`

const common: ReadonlySet<string> = new Set(COMMON.split(/\s+/).filter(Boolean))

/** Whether a password is among those that are tried first. Upper case does not make one rarer. */
export function isCommonPassword(password: string): boolean {
  return common.has(password.toLowerCase()) || /^(.)\1*$/u.test(password)
}
