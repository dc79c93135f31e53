export default { permalink: '/catalogue/index.html', up: '../' }
